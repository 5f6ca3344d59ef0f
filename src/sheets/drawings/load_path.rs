//! What bears on what: every member with its load, every bearing with its reaction, every landing in its place.

use sagledger_calc::building::{Building, Carrier};
use sagledger_calc::results::{BeamResult, Results};

use super::diagrams::listed;
use super::figures::{fixed, place, three};
use super::labels::{Column, Place, Placer, WIDE, centred, left_of, right_of, sideways};
use super::layout::{Layout, Member, Page, Paper, connected, lay_out, members};
use super::letters::{self, Face, Run, run, words};
use super::scene::{Drawing, Fill, Line, Path, Rect, Size, Text, point};

const PAPER: Paper =
    Paper { width: 113.0, rows: 9, gap: 13.0, clear: 2.8, scales: &[50.0, 100.0, 200.0, 500.0, 1000.0] };
/// Left edge of what is laid out.
const LEFT: f64 = 3.0;
/// Of the first level's line from the top, between levels, and what hangs below the last one.
const FIRST: f64 = 8.6;
const LEVEL: f64 = 24.0;
const LAST: f64 = 15.4;
/// The band of load above a member: its foot and its top.
const BAND: (f64, f64) = (1.0, 3.7);

/// A member as the drawing shows it; N and m.
#[derive(Clone, Debug, PartialEq)]
pub struct Shown {
    pub mark: String,
    pub place: Member,
    /// What loads it directly, in words, and the greatest characteristic total.
    pub loads: String,
    pub total: f64,
    pub seats: Vec<ShownSeat>,
}

/// What a seat stands on (the wall's name or the carrier's mark), with its greatest characteristic reaction.
#[derive(Clone, Debug, PartialEq)]
pub struct ShownSeat {
    pub on: String,
    pub reaction: f64,
}

/// The drawings of a whole building, from the members that nothing lands on down.
pub fn load_path(building: &Building, results: &Results) -> Vec<Drawing> {
    let places = members(building);
    let shown = building.beams.iter().zip(&results.beams).zip(places).map(|((beam, found), place)| Shown {
        mark: beam.mark.clone(),
        place,
        loads: names(found),
        total: greatest_total(found, results),
        seats: beam
            .bearings
            .iter()
            .zip(&found.bearings)
            .map(|(bearing, reaction)| ShownSeat {
                on: match bearing.on {
                    Carrier::Wall(wall) => building.walls.get(wall).map_or_else(String::new, |w| w.name.clone()),
                    Carrier::Beam { beam, .. } => {
                        building.beams.get(beam).map_or_else(String::new, |b| b.mark.clone())
                    }
                },
                reaction: reaction.characteristic_max.value.si(),
            })
            .collect(),
    });
    let shown: Vec<Shown> = shown.collect();
    drawings(&shown, &results.order)
}

/// "roof, floor and own weight".
fn names(found: &BeamResult) -> String {
    let mut names: Vec<String> = Vec::new();
    for row in &found.rows {
        if !names.contains(&row.what) {
            names.push(row.what.clone());
        }
    }
    if names.first().is_some_and(|n| n == "own weight") {
        names.rotate_left(1);
    }
    if names.len() > 4 {
        let more = names.len() - 3;
        names.truncate(3);
        names.push(format!("{more} more"));
    }
    listed(names.into_iter())
}

/// The rows' totals as printed in the take-down, summed for the characteristic combination that gives most.
fn greatest_total(found: &BeamResult, results: &Results) -> f64 {
    let totals = results.combinations.characteristic.iter().map(|combination| {
        let rows = found.rows.iter().flat_map(|row| &row.totals);
        rows.map(|(action, total)| {
            let variable = combination.variable.iter().find(|v| v.action == *action);
            let factor = match action {
                sagledger_calc::actions::Action::Permanent => 1.0,
                _ => variable.map_or(0.0, |v| v.factor()),
            };
            factor * total.si()
        })
        .sum::<f64>()
    });
    totals.fold(0.0, |most: f64, total| if total.abs() > most.abs() { total } else { most })
}

/// As many drawings as the members need; `order` names them from the top down.
pub fn drawings(shown: &[Shown], order: &[usize]) -> Vec<Drawing> {
    let places: Vec<Member> = shown.iter().map(|s| s.place.clone()).collect();
    let order: Vec<usize> = connected(&places, order).concat();
    let layout = lay_out(&places, &order, &PAPER);
    let count = layout.pages.len();
    let pages = layout.pages.iter().enumerate();
    pages.map(|(n, page)| Sheet::new(shown, &places, &layout, page).draw(n, count)).collect()
}

struct Sheet<'a> {
    shown: &'a [Shown],
    places: &'a [Member],
    layout: &'a Layout,
    page: &'a Page,
    drawing: Drawing,
    placer: Placer,
    column: Vec<Vec<Run>>,
}

/// A landing on this page: whose seat, where on paper, and whether its line is drawn.
struct Landing {
    member: usize,
    seat: usize,
    carrier: usize,
    lands: f64,
    upper: Option<(f64, f64)>,
    lower: Option<(f64, f64)>,
    joined: bool,
}

impl<'a> Sheet<'a> {
    fn new(shown: &'a [Shown], places: &'a [Member], layout: &'a Layout, page: &'a Page) -> Sheet<'a> {
        let height = FIRST + LEVEL * (page.rows.max(1) - 1) as f64 + LAST;
        let frame = Rect::new(-1.5, 0.0, 122.0, height);
        let drawing = Drawing::new("load-path", WIDE, height);
        Sheet { shown, places, layout, page, drawing, placer: Placer::new(frame), column: vec![] }
    }

    fn level(&self, row: usize) -> f64 {
        FIRST + LEVEL * row as f64
    }

    fn spot(&self, member: usize, at: f64) -> Option<(f64, f64)> {
        let placed = self.page.find(member)?;
        Some((LEFT + placed.x + at * self.layout.per_metre(), self.level(placed.row)))
    }

    fn draw(mut self, number: usize, count: usize) -> Drawing {
        let landings = self.landings();
        let page = self.page;
        for placed in &page.placed {
            self.member_line(placed.member);
        }
        for landing in &landings {
            self.landing_line(landing);
        }
        for placed in &page.placed {
            self.walls(placed.member);
        }
        for placed in &page.placed {
            self.mark(placed.member);
        }
        for placed in &page.placed {
            self.reactions_of_walls(placed.member);
        }
        for landing in &landings {
            self.landing_labels(landing);
        }
        for placed in &page.placed {
            self.load_label(placed.member);
        }
        self.notes(number, count);
        self.drawing.alt = self.alt();
        self.drawing
    }

    fn landings(&self) -> Vec<Landing> {
        let mut list = Vec::new();
        for (member, place) in self.places.iter().enumerate() {
            for (seat, s) in place.seats.iter().enumerate() {
                let Some((carrier, lands)) = s.on else { continue };
                let (upper, lower) = (self.spot(member, s.at), self.spot(carrier, lands));
                let joined = self.layout.joined(self.page, self.places, member, seat, PAPER.clear - 1e-3);
                if upper.is_some() || lower.is_some() {
                    list.push(Landing { member, seat, carrier, lands, upper, lower, joined });
                }
            }
        }
        list
    }

    fn member_line(&mut self, member: usize) {
        let length = self.places[member].length;
        let Some(((left, y), (right, _))) = self.spot(member, 0.0).zip(self.spot(member, length)) else { return };
        let band = Rect::new(left, y - BAND.1, right, y - BAND.0);
        if self.shown[member].total != 0.0 {
            self.drawing.fill(Fill::Tint10, None, Path::rectangle(band));
            self.drawing.stroke(Line::Edge, Path::line(point(left, band.top), point(right, band.top)));
        }
        self.placer.keep_off(Rect::new(left, band.top, right, y + 0.4));
        let line = Path::line(point(left, y), point(right, y));
        let tag = format!("member {}", self.shown[member].mark);
        self.drawing.tagged(Line::Member, line, tag);
    }

    fn landing_line(&mut self, landing: &Landing) {
        let tag = format!("landing {} {}", self.shown[landing.member].mark, landing.seat);
        match (landing.joined, landing.upper, landing.lower) {
            (true, Some((x, top)), Some((_, foot))) => {
                let line = Path::line(point(x, top + 0.35), point(x, foot - 6.2));
                self.placer.avoid(&line);
                self.drawing.tagged(Line::Dotted, line, tag);
                self.force(x, foot, self.shown[landing.member].seats[landing.seat].reaction);
            }
            _ => {
                if let Some((x, top)) = landing.upper {
                    let line = Path::line(point(x, top + 0.35), point(x, top + 4.8));
                    self.placer.avoid(&line);
                    self.drawing.tagged(Line::Dotted, line, tag);
                }
                if let Some((x, foot)) = landing.lower {
                    self.force(x, foot, self.shown[landing.member].seats[landing.seat].reaction);
                }
            }
        }
    }

    /// The arrow of a landing, its tip on the carrier.
    fn force(&mut self, x: f64, y: f64, reaction: f64) {
        let (far, near) = (point(x, y - 6.2), point(x, y - 0.5));
        self.placer.keep_off(Rect::new(x - 0.6, far.y, x + 0.6, near.y));
        if reaction >= 0.0 { self.drawing.arrow(far, near) } else { self.drawing.arrow(near, far) }
    }

    fn walls(&mut self, member: usize) {
        let seats = self.places[member].seats.clone();
        for (seat, shown) in seats.iter().zip(&self.shown[member].seats) {
            let Some((x, y)) = self.spot(member, seat.at).filter(|_| seat.on.is_none()) else { continue };
            self.drawing.wall(point(x, y));
            self.placer.keep_off(Rect::new(x - 3.0, y, x + 2.4, y + 2.0));
            let (tip, tail) = (point(x, y + 2.5), point(x, y + 8.0));
            self.placer.keep_off(Rect::new(x - 0.6, tip.y, x + 0.6, tail.y));
            if shown.reaction >= 0.0 { self.drawing.arrow(tail, tip) } else { self.drawing.arrow(tip, tail) }
        }
    }

    fn mark(&mut self, member: usize) {
        let mark = self.shown[member].mark.clone();
        let length = self.places[member].length;
        let Some(((left, y), (right, _))) = self.spot(member, 0.0).zip(self.spot(member, length)) else { return };
        let top = y - BAND.1 - 1.0;
        let reach = (right - left).max(4.0);
        let mut places: Vec<Place> =
            (0..=(reach / 1.5) as i32).map(|n| right_of(left + 1.5 * f64::from(n), top)).collect();
        places.extend((1..8).map(|n| right_of(left - 1.5 * f64::from(n), top)));
        places.extend([
            right_of(right + 1.2, y - 0.6),
            left_of(left - 1.2, y - 0.6),
            right_of(left + 0.6, y + 3.2),
        ]);
        places.extend((1..12).map(|n| left_of(right - 1.5 * f64::from(n), y + 3.2)));
        for width in [80.0, 34.0, 22.0, 14.0, 8.0] {
            let short = letters::shortened(Face::SemiBold, &mark, Size::Diagram, width);
            let runs = vec![run(Face::SemiBold, short.as_str())];
            if self.placer.place(&mut self.drawing, Size::Diagram, &runs, places.iter().copied()) {
                return;
            }
        }
        self.column.push(words(format!("{mark} is {} m long", fixed(length, 2))));
    }

    fn reaction(&self, member: usize, seat: usize) -> Vec<Run> {
        let figure = three(self.shown[member].seats[seat].reaction / 1e3);
        symbol_and(figure)
    }

    fn landing_labels(&mut self, landing: &Landing) {
        let reaction = self.reaction(landing.member, landing.seat);
        let carrier = self.shown[landing.carrier].mark.clone();
        let where_ = format!("at {} of {carrier}", place(landing.lands));
        match (landing.joined, landing.upper, landing.lower) {
            (true, Some((x, top)), Some((_, foot))) => {
                let steps = ((foot - 7.0 - top - 5.6) / 1.5).max(0.0) as i32;
                let heights = || (0..=steps).map(|n| top + 5.9 + 1.5 * f64::from(n));
                let figure = heights().flat_map(|y| [left_of(x - 1.2, y), right_of(x + 1.2, y)]);
                if !self.placer.place(&mut self.drawing, Size::Diagram, &reaction, figure) {
                    self.aside(landing.member, landing.seat, &where_);
                }
                let named = heights().flat_map(|y| [right_of(x + 1.2, y), left_of(x - 1.2, y)]);
                if !self.placer.place(&mut self.drawing, Size::Diagram, &words(where_.clone()), named) {
                    let mark = &self.shown[landing.member].mark;
                    self.column.push(words(format!("{mark} lands {where_}")));
                }
            }
            _ => {
                if let Some((x, y)) = landing.upper {
                    let figure = (0..4).flat_map(|n| {
                        let y = y + 4.4 + 1.5 * f64::from(n);
                        [right_of(x + 1.2, y), left_of(x - 1.2, y)]
                    });
                    let named = format!("on {carrier} at {}", place(landing.lands));
                    let name = around(x, y + 7.6).chain(around(x, y + 10.8));
                    let both = self.placer.place(&mut self.drawing, Size::Diagram, &reaction, figure)
                        && self.placer.place(&mut self.drawing, Size::Diagram, &words(named.clone()), name);
                    if !both {
                        self.aside(landing.member, landing.seat, &named);
                    }
                }
                if let Some((x, y)) = landing.lower {
                    let mark = self.shown[landing.member].mark.clone();
                    // Above the arrow in two lines, else beside it in one.
                    let upper = Text::centred(point(x, y - 10.5), words(format!("from {mark}")));
                    let lower = Text::centred(point(x, y - 7.4), reaction.clone());
                    if self.placer.is_free(&upper.rect()) && self.placer.is_free(&lower.rect()) {
                        for text in [upper, lower] {
                            self.placer.keep_off(text.rect());
                            self.drawing.texts.push(text);
                        }
                        return;
                    }
                    let mut from = words(format!("from {mark} "));
                    from.extend(reaction);
                    let places = [4.7, 6.3, 7.9, 9.5, 11.1]
                        .into_iter()
                        .flat_map(|up| [right_of(x + 1.2, y - up), left_of(x - 1.2, y - up)]);
                    if !self.placer.place(&mut self.drawing, Size::Diagram, &from, places) {
                        from.insert(0, run(Face::Regular, format!("{carrier} at {} ", place(landing.lands))));
                        self.column.push(from);
                    }
                }
            }
        }
    }

    /// A seat that found no room for its words beside it.
    fn aside(&mut self, member: usize, seat: usize, words: &str) {
        let at = place(self.places[member].seats[seat].at);
        let mut line = vec![run(Face::Regular, format!("{} at {at} ", self.shown[member].mark))];
        line.extend(self.reaction(member, seat));
        line.push(run(Face::Regular, format!(" {words}")));
        self.column.push(line);
    }

    fn reactions_of_walls(&mut self, member: usize) {
        for (n, seat) in self.places[member].seats.clone().iter().enumerate() {
            let Some((x, y)) = self.spot(member, seat.at).filter(|_| seat.on.is_none()) else { continue };
            let name = self.shown[member].seats[n].on.clone();
            let figure = [6.8, 5.2, 8.2]
                .into_iter()
                .flat_map(|down| [right_of(x + 1.5, y + down), left_of(x - 1.5, y + down)]);
            let reaction = self.reaction(member, n);
            let lower = around(x, y + 14.6);
            let mut told = self.placer.place(&mut self.drawing, Size::Diagram, &reaction, figure.chain(lower));
            for width in [60.0, 24.0, 15.0] {
                let short = letters::shortened(Face::Regular, &name, Size::Diagram, width);
                let placed = told
                    && self.placer.place(
                        &mut self.drawing,
                        Size::Diagram,
                        &words(short.clone()),
                        around(x, y + 11.4),
                    );
                if placed {
                    // A name cut short stands in full in the outer column.
                    told = short == name;
                    break;
                }
                if width == 15.0 {
                    told = false;
                }
            }
            if !told {
                self.aside(member, n, &name);
            }
        }
    }

    fn load_label(&mut self, member: usize) {
        let shown = &self.shown[member];
        let length = self.places[member].length;
        let Some(((left, y), (right, _))) = self.spot(member, 0.0).zip(self.spot(member, length)) else { return };
        if shown.total == 0.0 {
            return;
        }
        let total = run(Face::SemiBold, three(shown.total / 1e3));
        let top = y - BAND.1 - 1.0;
        for width in [120.0, 80.0, 56.0, 40.0, 26.0] {
            let name = letters::shortened(Face::Regular, &shown.loads, Size::Diagram, width);
            let runs = vec![run(Face::Regular, format!("{name} ")), total.clone()];
            let middle = 0.5 * (left + right);
            // Over the band, else to the right of what stands in the way.
            let along = (0..((right - left) / 2.0) as i32).map(|n| right_of(left + 2.0 * f64::from(n), top));
            let places = sideways(centred(middle, top), (0.6 * (right - left)).max(20.0)).chain(along);
            if self.placer.place(&mut self.drawing, Size::Diagram, &runs, places) {
                if name != shown.loads {
                    self.column.push(words(format!("{}: {}", shown.mark, shown.loads)));
                }
                return;
            }
        }
        let line = vec![run(Face::Regular, format!("{}: {} ", shown.mark, shown.loads)), total];
        self.column.push(line);
    }

    fn notes(&mut self, number: usize, count: usize) {
        let mut column = Column::new();
        let scale = fixed(self.layout.scale, 0);
        let mut first = format!("Spans 1:{scale}; levels are not to scale.");
        if count > 1 {
            first.push_str(&format!(
                " Drawing {} of {count}; a landing without a line is named at both its ends.",
                number + 1
            ));
        } else if self.landings().iter().any(|l| !l.joined) {
            first.push_str(" A landing without a line is named at both its ends.");
        }
        let plain = |column: &Column, text: &str| -> Vec<Vec<Run>> {
            column.wrap(Face::Regular, text).into_iter().map(words).collect()
        };
        let lines = plain(&column, &first);
        column.note(&mut self.drawing, 0.0, lines);
        let text = "is characteristic, the greatest of its combinations, in kN; see the table.";
        // The symbol takes the place of two letters and a space at the start of the first line.
        let mut lines = plain(&column, &format!("Rk {text}"));
        if let Some(line) = lines.first_mut() {
            let rest = letters::said(line).trim_start_matches("Rk").to_string();
            *line = symbol();
            line.push(run(Face::Regular, rest));
        }
        column.note(&mut self.drawing, 0.0, lines);
        let aside = std::mem::take(&mut self.column);
        let lines = aside.into_iter().flat_map(|line| broken(&column, line)).collect();
        column.note(&mut self.drawing, 0.0, lines);
        self.drawing.height = self.drawing.height.max(column.next() - 3.0);
    }

    fn alt(&self) -> String {
        let told = self.page.placed.iter().map(|p| {
            let shown = &self.shown[p.member];
            let seats = self.places[p.member].seats.iter().zip(&shown.seats).map(|(seat, s)| {
                let lands = seat.on.map_or_else(String::new, |(_, lands)| format!(" at {} of it", place(lands)));
                format!("on {}{lands} with {} kN at {}", s.on, three(s.reaction / 1e3), place(seat.at))
            });
            let load = match shown.total {
                0.0 => String::new(),
                total => format!(", loaded with {} {} kN", shown.loads, three(total / 1e3)),
            };
            format!("{}, {} m{load}, stands {}.", shown.mark, fixed(self.places[p.member].length, 2), listed(seats))
        });
        format!("What bears on what. {}", told.collect::<Vec<_>>().join(" "))
    }
}

/// Below a bearing: centred, then to either side.
fn around(x: f64, y: f64) -> impl Iterator<Item = Place> {
    [centred(x, y), right_of(x - 1.5, y), left_of(x + 1.5, y), right_of(x + 1.2, y), left_of(x - 1.2, y)]
        .into_iter()
}

/// The symbol of a characteristic reaction.
fn symbol() -> Vec<Run> {
    vec![run(Face::Symbol, "\u{1d445}"), run(Face::Subscript, "k")]
}

fn symbol_and(figure: String) -> Vec<Run> {
    let mut runs = symbol();
    runs.push(run(Face::SemiBold, format!("\u{a0}{figure}")));
    runs
}

/// A line of the outer column; one that is too wide is broken and set plain.
fn broken(column: &Column, line: Vec<Run>) -> Vec<Vec<Run>> {
    let plain = letters::said(&line).replace('\u{1d445}', "R");
    let lines = column.wrap(Face::Medium, &plain);
    if lines.len() <= 1 { vec![line] } else { lines.into_iter().map(words).collect() }
}
