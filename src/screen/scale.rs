//! The share of a limit on a scale of ten cells, with one beyond it.

use sagledger_calc::results::Verdict;

use super::Screen;

/// Cells from the zero tick to the limit tick, both included.
const CELLS: usize = 10;
/// Where the mark of what is not verified stands.
const MIDDLE: usize = 4;

/// The scale and its mark: eleven cells. The ring is in cell floor(9 u), at most 8, so that a met ring never covers
/// the limit; the triangle stands just beyond the tick, however far.
pub fn scale(screen: &Screen, verdict: Verdict, utilisation: Option<f64>) -> String {
    let line = screen.either("─", "-");
    let mut cells: Vec<&str> = vec![line; CELLS];
    cells[0] = screen.either("├", "|");
    cells[CELLS - 1] = screen.either("┤", "|");
    let mut beyond = " ";
    match verdict {
        Verdict::Met => {
            let share = utilisation.unwrap_or(0.0).max(0.0);
            let cell = if share.is_finite() { ((CELLS - 1) as f64 * share).floor().min(8.0) as usize } else { 8 };
            cells[cell.min(8)] = screen.either("○", "o");
        }
        Verdict::NotMet => beyond = screen.either("▲", "!"),
        Verdict::NotVerified => cells[MIDDLE] = screen.either("⊟", "?"),
    }
    format!("{}{beyond}", cells.concat())
}

/// The mark alone.
pub fn mark(screen: &Screen, verdict: Verdict) -> &'static str {
    match verdict {
        Verdict::Met => screen.either("○", "o"),
        Verdict::NotMet => screen.either("▲", "!"),
        Verdict::NotVerified => screen.either("⊟", "?"),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn marks_stand_at_their_share() {
        let at = |verdict, share| scale(&Screen::PIPE, verdict, share);
        assert_eq!(at(Verdict::Met, Some(0.80)), "├──────○─┤ ");
        assert_eq!(at(Verdict::Met, Some(0.96)), "├───────○┤ ");
        assert_eq!(at(Verdict::Met, Some(1.0)), "├───────○┤ ");
        assert_eq!(at(Verdict::Met, Some(0.05)), "○────────┤ ");
        assert_eq!(at(Verdict::NotMet, Some(1.15)), "├────────┤▲");
        assert_eq!(at(Verdict::NotVerified, None), "├───⊟────┤ ");
        let ascii = Screen { unicode: false, ..Screen::PIPE };
        assert_eq!(scale(&ascii, Verdict::NotMet, None), "|--------|!");
        assert_eq!(scale(&ascii, Verdict::NotVerified, None), "|---?----| ");
    }
}
