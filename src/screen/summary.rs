//! Several jobs: one line each, then all together.

use sagledger_calc::building::Building;
use sagledger_calc::checks::{account, places};
use sagledger_calc::results::{Check, Results, Verdict};
use sagledger_calc::workings::decimal::utilisation;

use super::table::{Align, Cell, Column, Row, lines};
use super::{Screen, scale};

pub struct Line<'a> {
    pub number: &'a str,
    pub title: &'a str,
    pub building: &'a Building,
    pub results: &'a Results,
}

pub fn text(screen: &Screen, jobs: &[Line]) -> String {
    let word = |head, gap| Column { head, align: Align::Left, gap };
    let columns = [word("job", 0), word("title", 2), word("closest check", 2), word("share of the limit", 2)];
    let rows: Vec<Row> = jobs.iter().map(|job| row(screen, job)).collect();
    let mut out = lines(screen, &columns, &rows);
    out.push(String::new());
    let count = |verdict| jobs.iter().filter(|job| job.results.verdict == verdict).count();
    let said: Vec<String> = [Verdict::Met, Verdict::NotMet, Verdict::NotVerified]
        .into_iter()
        .filter(|verdict| count(*verdict) > 0)
        .map(|verdict| format!("{} {} {}", scale::mark(screen, verdict), count(verdict), verdict.word()))
        .collect();
    out.push(format!("{} jobs: {}", jobs.len(), said.join(", ")));
    out.iter().map(|line| screen.plain(line)).collect::<Vec<_>>().join("\n") + "\n"
}

fn row(screen: &Screen, job: &Line) -> Row {
    let worst: Option<(usize, &Check)> = job.results.order.iter().fold(None, |worst, &beam| {
        let Some(check) = account::closest(&job.results.beams[beam]) else { return worst };
        match worst {
            Some((_, w)) if (w.verdict, w.utilisation) >= (check.verdict, check.utilisation) => worst,
            _ => Some((beam, check)),
        }
    });
    let (check, share) = match worst {
        None => (String::new(), job.results.verdict.word().to_string()),
        Some((beam, check)) => {
            let name = places::name(job.building, job.results, beam, check);
            let number = match (check.verdict, check.utilisation) {
                (Verdict::NotVerified, _) | (_, None) => String::new(),
                (_, Some(u)) => format!("{}  ", utilisation(u)),
            };
            let scale = scale::scale(screen, check.verdict, check.utilisation);
            (
                format!("{} {name}", job.building.beams[beam].mark),
                format!("{scale} {number}{}", check.verdict.word()),
            )
        }
    };
    let cells = vec![Cell::bold(job.number), Cell::of(job.title), Cell::of(check), Cell::of(share)];
    Row { cells, bold: job.results.verdict == Verdict::NotMet }
}
