//! The members around one member, small, for the outer column of its sheets.

use sagledger_calc::building::Building;

use super::diagrams::listed;
use super::labels::{Placer, left_of, right_of};
use super::layout::{Layout, Member, Paper, lay_out, lay_out_in, members};
use super::letters::{self, Face, run};
use super::scene::{Drawing, Line, Path, Rect, Size, point};

const WIDTH: f64 = 40.0;
const HEIGHT: f64 = 17.0;
const LEVEL: f64 = 5.5;
const FIRST: f64 = 3.8;
const PAPER: Paper = Paper { width: 37.6, rows: 60, gap: 5.0, clear: 1.0, scales: &[] };

/// The small drawing of what this member stands on and what lands on it. None for an index without a beam.
pub fn small_chain(building: &Building, beam: usize) -> Option<Drawing> {
    let all = members(building);
    let marks: Vec<&str> = building.beams.iter().map(|b| b.mark.as_str()).collect();
    drawing(&all, &marks, beam)
}

/// The richest choice of neighbours whose rows fit the height: the whole chain, then fewer and fewer.
fn drawing(all: &[Member], marks: &[&str], beam: usize) -> Option<Drawing> {
    all.get(beam)?;
    let fits = |layout: &Layout| layout.pages.len() == 1 && layout.pages[0].rows <= 3 && joined(layout, all);
    let chosen = neighbourhoods(all, beam);
    let laid = chosen.iter().map(|c| (c, lay_out_small(all, c)));
    let (members, layout) = laid.into_iter().find(|(_, l)| fits(l)).or_else(|| {
        let last = chosen.last()?;
        Some((last, lay_out_small(all, last)))
    })?;
    Some(drawn(all, marks, beam, members, &layout))
}

/// One scale for all: the widest drawing fills the width.
fn lay_out_small(all: &[Member], chosen: &[usize]) -> Layout {
    let free = Paper { width: 1e6, scales: &[1000.0], ..PAPER };
    let wide = lay_out(all, chosen, &free);
    let right = |l: &Layout| {
        let ends = l.pages.iter().flat_map(|p| &p.placed).map(|p| p.x + all[p.member].length * l.per_metre());
        ends.fold(0.0, f64::max)
    };
    let mut scale = (right(&wide) * 1000.0 / PAPER.width).max(50.0);
    let mut layout = wide;
    // Gaps between members do not shrink with the scale: a few rounds settle it.
    for _ in 0..4 {
        layout = lay_out_in(all, chosen, &Paper { width: 1e6, ..PAPER }, &[scale]);
        let over = right(&layout) / PAPER.width;
        if over <= 1.0 {
            break;
        }
        scale *= over * 1.02;
    }
    layout
}

/// Whether every landing among the members shown is drawn.
fn joined(layout: &Layout, all: &[Member]) -> bool {
    layout.pages.iter().all(|page| {
        page.placed.iter().all(|p| {
            all[p.member].seats.iter().enumerate().all(|(n, seat)| match seat.on {
                Some((carrier, _)) if page.find(carrier).is_some() => {
                    layout.joined(page, all, p.member, n, PAPER.clear - 1e-3)
                }
                _ => true,
            })
        })
    })
}

fn neighbourhoods(all: &[Member], beam: usize) -> Vec<Vec<usize>> {
    let on = |m: usize| all[m].seats.iter().filter_map(|s| s.on.map(|o| o.0)).collect::<Vec<usize>>();
    let landing = |m: usize| (0..all.len()).filter(|n| on(*n).contains(&m)).collect::<Vec<usize>>();
    let order: Vec<usize> = (0..all.len()).collect();
    let whole = super::layout::connected(all, &order).into_iter().find(|c| c.contains(&beam)).unwrap_or_default();
    let (below, above) = (on(beam), landing(beam));
    let lower = below.iter().flat_map(|m| on(*m)).collect::<Vec<usize>>();
    let few = |list: &[usize], most: usize| list.iter().copied().take(most).collect::<Vec<usize>>();
    let mut choices = vec![
        whole,
        [above.clone(), vec![beam], below.clone()].concat(),
        [vec![beam], below.clone(), lower].concat(),
        [few(&above, 2), vec![beam], below.clone()].concat(),
        [few(&above, 1), vec![beam], below.clone()].concat(),
        [vec![beam], below.clone()].concat(),
        [few(&above, 1), vec![beam], few(&below, 1)].concat(),
        [vec![beam], few(&below, 1)].concat(),
        vec![beam],
    ];
    for choice in &mut choices {
        choice.sort_unstable();
        choice.dedup();
    }
    choices
}

fn drawn(all: &[Member], marks: &[&str], beam: usize, members: &[usize], layout: &Layout) -> Drawing {
    let mut drawing = Drawing::new("small-chain", WIDTH, HEIGHT);
    let mut placer = Placer::new(Rect::new(-1.0, 0.0, WIDTH, HEIGHT));
    let Some(page) = layout.pages.first() else { return drawing };
    let per_metre = layout.per_metre();
    let spot = |member: usize, at: f64| {
        page.find(member).map(|p| point(1.2 + p.x + at * per_metre, FIRST + LEVEL * p.row as f64))
    };
    for m in members {
        let Some((a, b)) = spot(*m, 0.0).zip(spot(*m, all[*m].length)) else { continue };
        let here = *m == beam;
        let line = Path::line(a, b);
        placer.avoid(&line);
        drawing.stroke(if here { Line::MemberHere } else { Line::MemberOther }, line);
        for (n, seat) in all[*m].seats.iter().enumerate() {
            let Some(at) = spot(*m, seat.at) else { continue };
            let carrier = seat.on.and_then(|(c, lands)| spot(c, lands));
            match carrier {
                Some(foot) if layout.joined(page, all, *m, n, PAPER.clear - 1e-3) => {
                    let line = Path::line(at, foot);
                    placer.avoid(&line);
                    drawing.stroke(Line::Dotted, line);
                }
                _ => {
                    let foot = point(at.x, at.y + 1.1);
                    let bar = Path::line(point(foot.x - 0.9, foot.y), point(foot.x + 0.9, foot.y));
                    drawing.strokes_of(Line::Bearing, vec![Path::line(at, foot), bar], None);
                }
            }
        }
        // A landing whose member is not shown: a short arrow.
        for seat in (0..all.len()).filter(|n| !members.contains(n)).flat_map(|n| &all[n].seats) {
            if let Some((carrier, lands)) = seat.on
                && carrier == *m
                && let Some(at) = spot(*m, lands)
            {
                let tail = point(at.x, at.y - 2.2);
                placer.keep_off(Rect::new(at.x - 0.5, tail.y, at.x + 0.5, at.y));
                drawing.stroke(Line::MemberOther, Path::line(tail, point(at.x, at.y - 0.5)));
            }
        }
    }
    // This member's mark first.
    let mut order = members.to_vec();
    order.sort_by_key(|m| (*m != beam, *m));
    for m in order {
        let Some((a, b)) = spot(m, 0.0).zip(spot(m, all[m].length)) else { continue };
        let face = if m == beam { Face::SemiBold } else { Face::Regular };
        let room = (WIDTH - a.x).max(12.0);
        let runs = vec![run(face, letters::shortened(face, marks[m], Size::Least, room))];
        let up = a.y - if m == beam { 1.5 } else { 1.1 };
        let along = (0..12).map(|n| right_of(a.x + f64::from(n) * 1.5, up));
        let beside = [right_of(b.x + 1.0, a.y + 0.6), left_of(a.x - 1.0, a.y + 0.6), left_of(b.x, up)];
        placer.place(&mut drawing, Size::Least, &runs, along.chain(beside));
    }
    let others = members.iter().filter(|m| **m != beam).map(|m| marks[*m].to_string());
    let others = listed(others);
    drawing.alt = match others.is_empty() {
        true => format!("{} by itself.", marks[beam]),
        false => format!("Where {} stands in its chain, drawn with {others}.", marks[beam]),
    };
    drawing
}
