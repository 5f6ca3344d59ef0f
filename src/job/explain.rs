//! Facts that calc returns, put in words with the place in the job file that they are about.

use sagledger_calc::fault::{Fault as CalcFault, LoopStep};

use super::fault::{Fault, Span};
use super::origins::Origins;
use super::registry::Name;
use super::source::Source;

/// So many steps of a loop are named; the rest are counted.
const STEPS_NAMED: usize = 6;

pub(super) fn fault(fault: &CalcFault, origins: &Origins, source: &Source) -> Fault {
    match fault {
        CalcFault::CarriersLoop { bearings } => carriers_loop(bearings, origins, source),
        CalcFault::Mechanism { beam } => Fault::new(
            Name::Mechanism,
            origins.span(*beam).cloned(),
            "nothing holds this beam against moving",
            "give it two bearings that stand on something",
        ),
    }
}

/// A loop is marked where it closes: at the last of its bearings in the file.
pub(super) fn carriers_loop(steps: &[LoopStep], origins: &Origins, source: &Source) -> Fault {
    let place = |step: &LoopStep| origins.span(step.bearing).map(|span| span.start);
    let last = (0..steps.len()).max_by_key(|at| place(&steps[*at])).unwrap_or(0);
    let turned: Vec<&LoopStep> = steps.iter().cycle().skip(last + 1).take(steps.len()).collect();
    let Some((closing, before)) = turned.split_last() else {
        return Fault::new(
            Name::CarriersLoop,
            None,
            "a loop of beams",
            "let one of them stand on a wall or a post",
        );
    };
    let line = |step: &LoopStep| match origins.span(step.bearing) {
        Some(span) => format!("{} on {} ({})", step.mark, step.on, source.line_of(span.start)),
        None => format!("{} on {}", step.mark, step.on),
    };
    let mut parts: Vec<String> = before.iter().take(STEPS_NAMED).map(|step| line(step)).collect();
    if before.len() > STEPS_NAMED {
        parts.push(format!("{} more", before.len() - STEPS_NAMED));
    }
    parts.push(format!("{} on {}", closing.mark, closing.on));
    let fact = format!("a loop: {}", parts.join(", "));
    let remedy = match steps.len() {
        1 => "let it stand on a wall, a post or another beam".to_string(),
        n => format!("let one of the {} stand on a wall or a post", in_words(n)),
    };
    let also: Vec<Span> = before.iter().filter_map(|step| origins.span(step.bearing).cloned()).collect();
    Fault { also, ..Fault::new(Name::CarriersLoop, origins.span(closing.bearing).cloned(), fact, remedy) }
}

fn in_words(n: usize) -> String {
    let words = ["two", "three", "four", "five", "six", "seven", "eight", "nine", "ten"];
    n.checked_sub(2).and_then(|at| words.get(at)).map_or_else(|| n.to_string(), |word| word.to_string())
}
