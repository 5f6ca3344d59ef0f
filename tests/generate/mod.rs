//! Job files by chance, from a seed: valid, plausible buildings for sweeps, identities and benchmarks.
#![allow(dead_code)] // each test binary or bench that includes this module uses a part of it

pub mod building;
pub mod chains;
mod rows;

use fastrand::Rng;

/// A number between two others, on a grid of `step`.
fn on_grid(rng: &mut Rng, from: f64, to: f64, step: f64) -> f64 {
    let steps = ((to - from) / step).round().max(0.0) as u32;
    let value = from + f64::from(rng.u32(0..=steps)) * step;
    (value * 1e9).round() / 1e9
}

/// True this often in a hundred.
fn chance(rng: &mut Rng, percent: u32) -> bool {
    rng.u32(0..100) < percent
}

fn pick<T: Copy>(rng: &mut Rng, choices: &[T]) -> T {
    choices[rng.usize(0..choices.len())]
}

/// A length as people write it, in m or mm.
fn length(rng: &mut Rng, metres: f64) -> String {
    let whole_mm = (metres * 1e3).round();
    if (metres * 1e3 - whole_mm).abs() < 1e-9 && chance(rng, 30) {
        if chance(rng, 50) { format!("{whole_mm} mm") } else { format!("{whole_mm}mm") }
    } else {
        format!("{metres} m")
    }
}

/// A force, a line load or an area load given in kN, kN/m or kN/m2, in one of its accepted units.
fn force(rng: &mut Rng, kilo: f64, per: &str) -> String {
    let kilo = (kilo * 1e6).round() / 1e6;
    match per {
        "" if chance(rng, 20) => format!("{} N", kilo * 1e3),
        "" => format!("{kilo} kN"),
        "/m" if chance(rng, 20) => format!("{kilo} N/mm"),
        "/m" => format!("{kilo} kN/m"),
        _ => format!("{kilo} {}", pick(rng, &["kN/m2", "kN/m2", "kN/m²", "kPa"])),
    }
}
