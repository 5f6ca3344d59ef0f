//! Rules of combination, on beams on two bearings.

use super::*;

pub fn cases() -> Vec<Case> {
    let mut cases = handbook_expressions();
    cases.push(heavy_permanent());
    cases.push(two_categories());
    cases.extend(roof_snow_and_wind());
    cases.push(wind_uplift());
    cases
}

fn simple(basis: &str, section: &str, span: f64, rows: &[&str]) -> String {
    job(basis, &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], rows))
}

/// 5 m span, G 6 and Q 4 kN/m, category A: moments by each expression, EN 1990.
fn handbook_expressions() -> Vec<Case> {
    let section = "203x133x25 UB";
    let (_, weight) = stiffness_and_weight(section);
    let rows = [line("permanent", 6.0 - weight), line("imposed", 4.0)];
    [
        ("6.10", "combination = \"6.10\"", 44.1, 1.35 * 6.0 + 1.5 * 4.0),
        ("6.10b UK", "combination = \"6.10a/b\"", 42.2, 0.925 * 1.35 * 6.0 + 1.5 * 4.0),
        (
            "6.10b recommended",
            "combination = \"6.10a/b\"\nnational-choices = \"recommended\"",
            40.3,
            0.85 * 1.35 * 6.0 + 1.5 * 4.0,
        ),
    ]
    .into_iter()
    .map(|(name, basis, printed, load)| {
        Case::new(name, "EN 1990 6.4.3.2", simple(basis, section, 5.0, &[&rows[0], &rows[1]]))
            .is("beams.0.moment_kNm.max", printed, PRINTED)
            .is("beams.0.moment_kNm.max", load * 25.0 / 8.0, EXACT)
    })
    .collect()
}

/// Where permanent load rules, 6.10a does: 1.35 x 12 + 1.5 x 0.7 x 1 is more than 0.925 x 1.35 x 12 + 1.5 x 1.
fn heavy_permanent() -> Case {
    let section = "254x102x25 UB";
    let (_, weight) = stiffness_and_weight(section);
    Case::new(
        "6.10a",
        "EN 1990 6.4.3.2",
        simple(
            "combination = \"6.10a/b\"",
            section,
            4.0,
            &[&line("permanent", 12.0 - weight), &line("imposed", 1.0)],
        ),
    )
    .is("beams.0.moment_kNm.max", (1.35 * 12.0 + 1.5 * 0.7) * 2.0, EXACT)
}

/// Imposed loads of A to G are one action: G 5, A 4, C 4 kN/m make 18.75 kN/m (EN 1991-1-1 3.3.1).
fn two_categories() -> Case {
    let section = "203x102x23 UB";
    let (_, weight) = stiffness_and_weight(section);
    let second = "  imposed = \"4 kN/m\"\n  category = \"C\"";
    Case::new(
        "two categories together",
        "EN 1991-1-1 3.3.1: 18.75 kN/m by 6.10",
        simple("", section, 4.0, &[&line("permanent", 5.0 - weight), &line("imposed", 4.0), second]),
    )
    .is("beams.0.bearings.0.reaction_kN.design_max", 18.75 * 2.0, EXACT)
    .is("beams.0.bearings.0.reaction_kN.imposed C", 8.0, EXACT)
}

/// G, A 2.0, H 1.5, snow 1.2, wind 0.8 kN/m down. UK: A leads with 0.7 H (3.05) over A with snow and wind (3.00).
/// Recommended: psi_0 is 0 for H and 0.6 for wind: A + 0.5 S + 0.6 W = 3.08 over 0.7 A + H = 2.9.
fn roof_snow_and_wind() -> Vec<Case> {
    let section = "203x102x23 UB";
    let (_, weight) = stiffness_and_weight(section);
    let roof = "  imposed = \"1.5 kN/m\"\n  category = \"H\"";
    let rows = [line("permanent", 1.0), line("imposed", 2.0), line("snow", 1.2), line("wind", 0.8)];
    [("UK", 3.05), ("recommended", 3.08)]
        .into_iter()
        .map(|(choices, variable)| {
            let basis = format!("national-choices = \"{choices}\"");
            Case::new(
                "imposed, roof, snow and wind",
                "EN 1990 (6.10), EN 1991-1-1 3.3.2, by hand",
                simple(&basis, section, 4.0, &[&rows[0], &rows[1], &rows[2], &rows[3], roof]),
            )
            .is("beams.0.bearings.0.reaction_kN.design_max", (1.35 * (1.0 + weight) + 1.5 * variable) * 2.0, EXACT)
            .is("beams.0.bearings.0.reaction_kN.characteristic_max", (1.0 + weight + variable) * 2.0, EXACT)
            .is("beams.0.bearings.0.reaction_kN.imposed H", 3.0, EXACT)
            .is("beams.0.bearings.0.reaction_kN.snow", 2.4, EXACT)
            .is("beams.0.bearings.0.reaction_kN.wind", 1.6, EXACT)
        })
        .collect()
}

/// Two wind cases, one up: set B leaves 1.0 G - 1.5 W, set A 0.9 G - 1.5 W.
fn wind_uplift() -> Case {
    let section = "178x102x19 UB";
    let (_, weight) = stiffness_and_weight(section);
    let permanent = 0.9 + weight;
    let west = format!("{}\n  wind-case = \"west\"", line("wind", -2.0));
    Case::new(
        "wind uplift",
        "EN 1990 6.4.3.2 sets A and B, by hand",
        simple("", section, 3.0, &[&line("permanent", 0.9), &west, &line("wind", 0.7)]),
    )
    .is("beams.0.bearings.0.reaction_kN.wind west", -3.0, EXACT)
    .is("beams.0.bearings.1.reaction_kN.wind", 1.05, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_max", (1.35 * permanent + 1.5 * 0.7) * 1.5, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_min", (permanent - 1.5 * 2.0) * 1.5, EXACT)
    .is("beams.0.bearings.0.reaction_kN.uplift_max", (1.5 * 2.0 - 0.9 * permanent) * 1.5, EXACT)
    .is("beams.0.moment_kNm.min", (permanent - 1.5 * 2.0) * 9.0 / 8.0, EXACT)
}
