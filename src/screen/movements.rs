//! The ledger of stacked movements: each row under its own governing combination.

use sagledger_calc::building::Building;
use sagledger_calc::results::{Results, Stacked};
use sagledger_calc::workings::decimal::{along, movement};

use super::table::{Align, Cell, Column, Row, lines};
use super::{Screen, ledger};

/// The longest limit that a bar shows at one millimetre a cell.
const BAR: f64 = 26.0;

pub fn table(screen: &Screen, building: &Building, results: &Results) -> Vec<String> {
    let mut columns = vec![Column { head: "movement", align: Align::Left, gap: 0 }];
    let right = |head, gap| Column { head, align: Align::Right, gap };
    columns.extend([
        right("at m", 2),
        right("own", 4),
        right("settled", 2),
        right("inherited", 2),
        right("stacked", 2),
        right("limit", 3),
        right("left mm", 1),
    ]);
    if screen.is_wide() {
        columns.push(Column { head: "how the limit is used", align: Align::Left, gap: 3 });
        columns.push(Column { head: "hand rule", align: Align::Left, gap: 1 });
    }
    let cell = per_cell(results);
    let rows = results.order.iter().map(|&beam| {
        let m = &results.beams[beam].movements;
        let shown = m.governing.as_ref().unwrap_or(&m.stacked);
        let left = shown.limit.map(|limit| limit.si() - shown.total.value.si().abs());
        let mut cells = vec![
            Cell::bold(format!("{}{}", ledger::indent(results, beam), building.beams[beam].mark)),
            Cell::of(along(shown.total.at.si())),
            Cell::of(movement(shown.own.si())),
            Cell::of(movement(shown.settled.si())),
            Cell::of(movement(shown.inherited.si())),
            Cell::bold(movement(shown.total.value.si())),
            Cell::of(shown.limit.map_or(String::new(), |l| movement(l.si()))),
            Cell::of(left.map_or(String::new(), movement)),
        ];
        if screen.is_wide() {
            cells.push(Cell::of(bar(screen, results, shown, cell)));
            cells.push(Cell::of(hand_rule(results, beam)));
        }
        Row { cells, bold: left.is_some_and(|l| l < 0.0) }
    });
    lines(screen, &columns, &rows.collect::<Vec<_>>())
}

/// Millimetres a cell: 1, or 2, 5, 10 where the longest limit does not fit.
fn per_cell(results: &Results) -> f64 {
    let limits = results.beams.iter().filter_map(|b| b.movements.governing.as_ref().and_then(|g| g.limit));
    let longest = limits.map(|l| l.to_mm()).fold(0.0, f64::max);
    [1.0, 2.0, 5.0, 10.0].into_iter().find(|mm| longest / mm <= BAR).unwrap_or(10.0)
}

/// Each beam keeps its fill in every bar: the top level solid, the next lighter, the others lighter still.
fn bar(screen: &Screen, results: &Results, shown: &Stacked, per_cell: f64) -> String {
    let Some(limit) = shown.limit else { return String::new() };
    let end = |mm: f64| (mm / per_cell).round().clamp(0.0, 60.0) as usize;
    let tick = end(limit.to_mm());
    let mut cells: Vec<&str> = Vec::new();
    let mut sum = 0.0;
    let shares = shown.shares.iter().map(|(beam, share)| (Some(*beam), *share));
    for (beam, share) in shares.chain([(None, shown.settled)]) {
        sum += share.to_mm();
        let fill = match beam.map(|b| results.beams[b].level) {
            Some(0) => screen.either("█", "#"),
            Some(1) => screen.either("▒", "="),
            Some(_) => screen.either("░", ":"),
            None => " ",
        };
        while cells.len() < end(sum) {
            cells.push(fill);
        }
    }
    while cells.len() < tick {
        cells.push(screen.either("╌", "."));
    }
    cells.insert(tick, screen.either("│", "|"));
    cells.concat()
}

/// The hand rule with its difference from the exact movement.
fn hand_rule(results: &Results, beam: usize) -> String {
    let m = &results.beams[beam].movements;
    let rule = movement(m.hand_rule.si());
    // From the full figures, as on the sheets; it may differ by 0.1 from the difference of the two printed ones.
    let difference = m.hand_rule.si() - m.stacked.total.value.si().abs();
    let by = movement(difference.abs());
    match difference {
        _ if by == movement(0.0) => format!("{rule} the same"),
        d if d > 0.0 => format!("{rule} safe by {by}"),
        _ => format!("{rule} unsafe by {by}"),
    }
}
