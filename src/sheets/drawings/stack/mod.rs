//! A chain of beams with its movements, level by level: each beam sags from what it stands on, and what it stands
//! on sags too. Movements print full size wherever they can.

mod paint;

use sagledger_calc::building::{Building, Carrier};
use sagledger_calc::results::{Chain, Curve, Results};

use super::diagrams::listed;
use super::figures::{fixed, place, tenth};
use super::labels::{Column, Placer, WIDE};
use super::layout::{Layout, Member, Page, Paper, lay_out, members};
use super::letters::{Face, Run, run, words};
use super::scene::{Drawing, Rect};
use super::shape;

const PAPER: Paper =
    Paper { width: 113.0, rows: 5, gap: 24.0, clear: 3.0, scales: &[50.0, 100.0, 200.0, 500.0, 1000.0] };
/// Left edge of what is laid out.
const LEFT: f64 = 3.0;
/// Level of the first beam from the top.
const FIRST: f64 = 7.0;
/// Distance of levels, with figures and on the cover.
const LEVEL: f64 = 43.0;
const COVER_LEVEL: f64 = 25.0;
/// By these the cover makes movements smaller until the whole chain fits.
const COVER_FACTORS: [f64; 4] = [1.0, 0.5, 0.2, 0.1];
/// Greatest height of a drawing on a sheet of its own, and on the cover.
const TALLEST: f64 = 232.0;
const TALLEST_COVER: f64 = 80.0;
/// Movements that are neither lost nor too large when printed full size, in mm on paper.
const SEEN: f64 = 2.0;
const LARGE: f64 = 36.0;

/// What is drawn of a chain; m throughout, movements downward positive.
#[derive(Clone, Debug)]
pub struct Stack {
    /// All members of the building, so that indices hold; only `beams` are drawn.
    pub places: Vec<Member>,
    pub beams: Vec<Moved>,
    /// The combination that is drawn.
    pub combination: String,
    pub governing: Option<Governing>,
}

/// A beam of the chain.
#[derive(Clone, Debug)]
pub struct Moved {
    pub member: usize,
    pub mark: String,
    /// What its seats stand on, and how far these move.
    pub on: Vec<String>,
    pub seats: Vec<f64>,
    pub own: Curve,
    pub stacked: Curve,
}

/// The point that is written out.
#[derive(Clone, Debug)]
pub struct Governing {
    pub member: usize,
    pub at: f64,
    pub own: f64,
    pub inherited: f64,
    pub settled: f64,
    pub total: f64,
    pub limit: Option<f64>,
}

impl Governing {
    fn terms(&self) -> [(&'static str, f64); 3] {
        [("own", self.own), ("inherited", self.inherited), ("settled", self.settled)]
    }
}

impl Stack {
    /// A chain of a calculated building.
    pub fn of(building: &Building, results: &Results, chain: &Chain) -> Stack {
        let name = |on: &Carrier| match on {
            Carrier::Wall(wall) => building.walls.get(*wall).map_or_else(String::new, |w| w.name.clone()),
            Carrier::Beam { beam, .. } => building.beams.get(*beam).map_or_else(String::new, |b| b.mark.clone()),
        };
        let beams = chain.curves.iter().filter_map(|curve| {
            let beam = building.beams.get(curve.beam)?;
            Some(Moved {
                member: curve.beam,
                mark: beam.mark.clone(),
                on: beam.bearings.iter().map(|b| name(&b.on)).collect(),
                seats: curve.bearings.iter().map(|m| m.si()).collect(),
                own: curve.own.clone(),
                stacked: curve.stacked.clone(),
            })
        });
        let governing = results.beams.get(chain.governing_beam).map(|found| {
            let stacked = found.movements.governing.as_ref().unwrap_or(&found.movements.stacked);
            Governing {
                member: chain.governing_beam,
                at: stacked.total.at.si(),
                own: stacked.own.si(),
                inherited: stacked.inherited.si(),
                settled: stacked.settled.si(),
                total: stacked.total.value.si(),
                limit: stacked.limit.map(|l| l.si()),
            }
        });
        let combination = results.combinations.get(chain.characteristic);
        Stack {
            places: members(building),
            beams: beams.collect(),
            combination: combination.map_or_else(String::new, |c| c.name(&results.actions)),
            governing,
        }
    }

    fn moved(&self, member: usize) -> Option<&Moved> {
        self.beams.iter().find(|b| b.member == member)
    }

    /// What a beam moves with besides its own bending: what carries it, walls that settle, or both.
    fn rest_of(&self, member: usize) -> &'static str {
        let settles = self.beams.iter().any(|b| {
            let seats = self.places[b.member].seats.iter().zip(&b.seats);
            seats.into_iter().any(|(seat, moved)| seat.on.is_none() && *moved != 0.0)
        });
        let carried = self.places[member].seats.iter().any(|s| s.on.is_some());
        match (carried, settles) {
            (true, true) => "inherited and settled",
            (false, true) => "settled",
            _ => "inherited",
        }
    }

    /// Greatest movements down and up over some beams, in mm.
    fn extent(&self, members: impl Iterator<Item = usize>) -> (f64, f64) {
        let ranges = members.filter_map(|m| self.moved(m)).map(|b| shape::range(&b.stacked));
        ranges
            .fold((0.0, 0.0), |(down, up), (least, most)| (f64::max(down, most * 1e3), f64::max(up, -least * 1e3)))
    }

    /// mm on paper for a mm of movement: full size unless that is too small to see or too large to print.
    fn magnification(&self) -> f64 {
        let (down, up) = self.extent(self.beams.iter().map(|b| b.member));
        let most = down + up;
        if most > LARGE {
            [0.5, 0.2, 0.1, 0.05, 0.02, 0.01].into_iter().find(|k| k * most <= LARGE).unwrap_or(0.005)
        } else if most < SEEN && most > 0.0 {
            [2.0, 5.0, 10.0].into_iter().find(|k| k * most >= SEEN).unwrap_or(10.0)
        } else {
            1.0
        }
    }

    /// The chain with its figures, on as many drawings as it needs.
    pub fn drawings(&self) -> Vec<Drawing> {
        self.pages(self.magnification(), LEVEL, TALLEST, true)
    }

    /// The same without figures, for the cover: the whole chain, its movements smaller where it has many levels; a
    /// chain that fits nowhere near is shown by the drawing with the governing beam.
    pub fn cover(&self) -> Option<Drawing> {
        let k = self.magnification();
        let smaller = COVER_FACTORS.iter().map(|factor| self.pages(k * factor, COVER_LEVEL, TALLEST_COVER, false));
        let mut last = Vec::new();
        for pages in smaller {
            let whole = pages.len() == 1;
            last = pages;
            if whole {
                break;
            }
        }
        last.into_iter().next()
    }

    /// Fewer levels a drawing until each drawing fits its height.
    fn pages(&self, k: f64, level: f64, tallest: f64, figures: bool) -> Vec<Drawing> {
        let chosen: Vec<usize> = self.beams.iter().map(|b| b.member).collect();
        let mut rows = if figures { 5 } else { 6 };
        loop {
            let layout = lay_out(&self.places, &chosen, &Paper { rows, ..PAPER });
            let levels: Vec<Levels> =
                layout.pages.iter().map(|p| self.levels(p, k, level, tallest, figures)).collect();
            if rows > 1 && levels.iter().any(|l| l.height > tallest) {
                rows -= 1;
                continue;
            }
            return self.drawn(&layout, levels, k, figures);
        }
    }

    /// Where the rows of a page stand: at their distance, or farther apart where movements need the room; on the
    /// cover closer, down to what the movements need, if the drawing would else be too tall.
    fn levels(&self, page: &Page, k: f64, distance: f64, tallest: f64, figures: bool) -> Levels {
        let extents: Vec<(f64, f64)> = (0..page.rows.max(1))
            .map(|row| {
                let (down, up) = self.extent(page.placed.iter().filter(|p| p.row == row).map(|p| p.member));
                (down * k, up * k)
            })
            .collect();
        let air = if figures { 17.0 } else { 9.0 };
        let foot = if figures { 10.0 } else { 5.0 };
        let stand = |distance: f64| {
            let mut at = vec![FIRST + extents[0].1];
            for pair in extents.windows(2) {
                let last = at.last().copied().unwrap_or(0.0);
                at.push(last + distance.max(pair[0].0 + pair[1].1 + air));
            }
            let last = at.last().copied().unwrap_or(0.0) + extents.last().map_or(0.0, |e| e.0);
            Levels { at, height: last + foot }
        };
        let full = stand(distance);
        if figures || full.height <= tallest { full } else { stand(distance.min(15.0)) }
    }

    fn drawn(&self, layout: &Layout, levels: Vec<Levels>, k: f64, figures: bool) -> Vec<Drawing> {
        let mut pages: Vec<(&Page, Levels)> = layout.pages.iter().zip(levels).collect();
        if !figures && let Some(governing) = &self.governing {
            pages.sort_by_key(|(p, _)| p.find(governing.member).is_none());
        }
        let kind = if figures { "stack-drawing" } else { "cover-picture" };
        let drawings = pages.into_iter().map(|(page, levels)| {
            let height = levels.height;
            let sheet = Sheet {
                stack: self,
                layout,
                page,
                k,
                levels: levels.at,
                drawing: Drawing::new(kind, WIDE, height),
                placer: Placer::new(Rect::new(-1.5, 0.0, 122.5, height)),
                figures,
            };
            sheet.draw()
        });
        drawings.collect()
    }
}

/// Heights of the undeformed lines of a page's rows, and of the whole.
struct Levels {
    at: Vec<f64>,
    height: f64,
}

struct Sheet<'a> {
    stack: &'a Stack,
    layout: &'a Layout,
    page: &'a Page,
    /// mm on paper for a mm of movement.
    k: f64,
    /// Heights of the rows' undeformed lines.
    levels: Vec<f64>,
    drawing: Drawing,
    placer: Placer,
    figures: bool,
}

impl Sheet<'_> {
    fn draw(mut self) -> Drawing {
        let page = self.page;
        let beams: Vec<usize> = page.placed.iter().map(|p| p.member).collect();
        for beam in &beams {
            self.lines(*beam);
        }
        let governing = self.stack.governing.clone().filter(|g| beams.contains(&g.member));
        if self.figures {
            if let Some(governing) = &governing {
                self.governing_lines(governing);
            }
            beams.iter().for_each(|b| self.mm_ruler(*b));
        }
        beams.iter().for_each(|b| self.mark(*b));
        if self.figures {
            if let Some(governing) = &governing {
                self.governing_figures(governing);
            }
            let others = beams.iter().filter(|b| governing.as_ref().is_none_or(|g| g.member != **b));
            others.for_each(|b| self.greatest(*b));
            beams.iter().for_each(|b| self.landing_figures(*b));
            self.column(governing.as_ref());
        } else {
            self.caption();
        }
        self.drawing.alt = self.alt(&beams);
        self.drawing
    }

    /// What the scales are, in words.
    fn scales(&self) -> (String, String) {
        let scale = fixed(self.layout.scale, 0);
        let factor = self.k * self.layout.scale;
        let spans = format!("Spans 1:{scale}; levels are not to scale.");
        let text = format!(
            "{spans} Movements are drawn {} times the scale of the spans, which prints them",
            fixed(factor, 0)
        );
        match self.k {
            1.0 => (format!("{text} full size:"), "one millimetre on paper is one millimetre of movement.".into()),
            k if k > 1.0 => {
                (format!("{text} {k} times full size:"), format!("{k} mm on paper are 1 mm of movement."))
            }
            k => (
                format!("{text} smaller than they are:"),
                format!("1 mm on paper is {} mm of movement.", fixed(1.0 / k, 0)),
            ),
        }
    }

    fn column(&mut self, governing: Option<&Governing>) {
        let mut column = Column::new();
        let (scales, promise) = self.scales();
        let mut lines: Vec<Vec<Run>> = column.wrap(Face::Regular, &scales).into_iter().map(words).collect();
        lines.extend(column.wrap(Face::SemiBold, &promise).into_iter().map(|l| vec![run(Face::Medium, l)]));
        column.note(&mut self.drawing, 0.0, lines);
        let mut placed = self.page.placed.clone();
        placed.sort_by(|a, b| a.row.cmp(&b.row).then(a.x.total_cmp(&b.x)));
        for p in placed {
            let level = self.level(p.row) + if p.row == 0 { 0.0 } else { 6.0 };
            for (title, body) in self.sums(p.member, governing) {
                let mut lines: Vec<Vec<Run>> = Vec::new();
                lines.extend(column.wrap(Face::Medium, &title).into_iter().map(|l| vec![run(Face::Medium, l)]));
                for line in body {
                    lines.extend(column.wrap(Face::Regular, &line).into_iter().map(words));
                }
                column.note(&mut self.drawing, level, lines);
            }
        }
        self.drawing.height = self.drawing.height.max(column.next() - 3.0);
    }

    /// What is written beside a beam: the governing point, or each landing's movement, as sums.
    fn sums(&self, member: usize, governing: Option<&Governing>) -> Vec<(String, Vec<String>)> {
        let Some(beam) = self.stack.moved(member) else { return vec![] };
        let mut list = Vec::new();
        if let Some(g) = governing.filter(|g| g.member == member) {
            let from = match (self.stack.places[member].seats.first(), beam.on.first()) {
                (Some(seat), Some(on)) if seat.at == 0.0 && seat.on.is_none() => {
                    format!("from the {}", on.trim_start_matches("the "))
                }
                (Some(seat), Some(on)) if seat.at == 0.0 => format!("from {on}"),
                _ => "from its first end".to_string(),
            };
            let mut body = vec![format!("{}, {} {from}", beam.mark, place(g.at))];
            body.push(sum(g.terms(), g.total));
            if let Some(limit) = g.limit {
                body.push(format!("limit {} mm", tenth(limit * 1e3)));
            }
            list.push(("Governing point".to_string(), body));
        }
        for other in &self.stack.beams {
            for seat in &self.stack.places[other.member].seats {
                let Some((_, lands)) = seat.on.filter(|(carrier, _)| *carrier == member) else { continue };
                let own = shape::value_at(&beam.own, lands);
                let total = shape::value_at(&beam.stacked, lands);
                let title = format!("{} at {}, {} lands", beam.mark, place(lands), other.mark);
                let rest = (self.stack.rest_of(member), total - own);
                list.push((title, vec![sum([("own", own), rest, ("", 0.0)], total)]));
            }
        }
        list
    }

    fn caption(&mut self) {
        let mut column = Column::new();
        let scale = fixed(self.layout.scale, 0);
        let text = match self.k {
            1.0 => format!("Spans 1:{scale}. Movements printed full size: one millimetre is one millimetre."),
            _ => format!(
                "Spans 1:{scale}. Movements {} times the scale of the spans.",
                fixed(self.k * self.layout.scale, 0)
            ),
        };
        let lines: Vec<Vec<Run>> = column.wrap(Face::Regular, &text).into_iter().map(words).collect();
        let top = self.drawing.height - 3.6 * lines.len() as f64 - 4.0;
        column.note(&mut self.drawing, top.max(0.0), lines);
    }

    fn alt(&self, beams: &[usize]) -> String {
        let told =
            beams.iter().filter_map(|b| {
                let beam = self.stack.moved(*b)?;
                let seats =
                    self.stack.places[*b].seats.iter().zip(&beam.on).zip(&beam.seats).map(|((seat, on), moved)| {
                        format!("{} mm at {} on {on}", tenth(moved * 1e3), place(seat.at))
                    });
                let seats = listed(seats);
                let most = paint::greatest(&beam.stacked)?;
                Some(format!(
                    "{}: bearings move {seats}; greatest movement {} mm at {}.",
                    beam.mark,
                    tenth(most.value * 1e3),
                    place(most.at)
                ))
            });
        let told = told.collect::<Vec<_>>().join(" ");
        let governing = self.stack.governing.as_ref().filter(|g| beams.contains(&g.member)).map(|g| {
            let mark = self.stack.moved(g.member).map_or("", |b| b.mark.as_str());
            let limit = g.limit.map_or_else(String::new, |l| format!(", limit {} mm", tenth(l * 1e3)));
            format!(" Governing point: {mark} at {}, {}{limit}.", place(g.at), sum(g.terms(), g.total))
        });
        let (scales, promise) = self.scales();
        format!(
            "Movements of the chain for {}. {told}{} {scales} {promise}",
            self.stack.combination,
            governing.unwrap_or_default()
        )
    }
}

/// "own 10.4 + inherited 6.2 = 16.6", in mm, with as many decimals as make the sum right.
fn sum(terms: [(&str, f64); 3], total: f64) -> String {
    let adds = |decimals: i32| {
        let unit = (0..decimals).fold(1e3, |u: f64, _| u * 10.0);
        let parts = terms.iter().map(|(_, t)| (t * unit).round()).sum::<f64>();
        (parts - (total * unit).round()).abs() < 0.5
    };
    let decimals = (1..=3).find(|d| adds(*d)).unwrap_or(1);
    let text = |movement: f64| fixed(movement * 1e3, decimals);
    let mut line = format!("{} {}", terms[0].0, text(terms[0].1));
    let mut alone = true;
    for (name, movement) in &terms[1..] {
        let figure = text(*movement);
        if super::figures::is_zero(&figure) {
            continue;
        }
        alone = false;
        line.push_str(&match figure.strip_prefix('\u{2212}') {
            Some(size) => format!(" \u{2212} {name} {size}"),
            None => format!(" + {name} {figure}"),
        });
    }
    if alone { format!("{line} mm") } else { format!("{line} = {}", text(total)) }
}
