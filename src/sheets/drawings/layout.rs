//! Where the members of a building stand in drawings of what bears on what.
//!
//! A bearing stands exactly above its landing wherever one flat layout allows it; members that are joined in this
//! way form a cluster and move together. Rows are chosen so that no landing line crosses a member. A landing that
//! cannot be drawn as a straight upright line, or whose carrier stands in another drawing, is cut: it is named at
//! both ends instead.

use sagledger_calc::building::{Building, Carrier};

/// A member as far as its place is concerned; m.
#[derive(Clone, Debug, PartialEq)]
pub struct Member {
    pub length: f64,
    pub seats: Vec<Seat>,
}

#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Seat {
    pub at: f64,
    /// The carrying member and the place along it; none on a wall.
    pub on: Option<(usize, f64)>,
}

/// The members of a building in its own order.
pub fn members(building: &Building) -> Vec<Member> {
    let seat = |b: &sagledger_calc::building::Bearing| Seat {
        at: b.at.si(),
        on: match b.on {
            Carrier::Wall(_) => None,
            Carrier::Beam { beam, lands } => Some((beam, lands.si())),
        },
    };
    let beams = building.beams.iter();
    beams.map(|b| Member { length: b.length.si(), seats: b.bearings.iter().map(seat).collect() }).collect()
}

/// The paper that a layout may use, and the distances it keeps; mm.
#[derive(Clone, Copy, Debug)]
pub struct Paper {
    pub width: f64,
    /// Rows of members that fit on one drawing.
    pub rows: usize,
    /// Between members of one row.
    pub gap: f64,
    /// Between a landing line and a member that it passes.
    pub clear: f64,
    /// Scales to choose from, the first that fits: 100 stands for 1:100.
    pub scales: &'static [f64],
}

/// A member in its place: `x` is its first end in mm, `row` counts from the top.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Placed {
    pub member: usize,
    pub row: usize,
    pub x: f64,
}

/// One drawing.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Page {
    pub placed: Vec<Placed>,
    pub rows: usize,
}

#[derive(Clone, Debug, PartialEq)]
pub struct Layout {
    pub scale: f64,
    pub pages: Vec<Page>,
}

impl Page {
    pub fn find(&self, member: usize) -> Option<&Placed> {
        self.placed.iter().find(|p| p.member == member)
    }
}

impl Layout {
    /// mm on paper for one metre.
    pub fn per_metre(&self) -> f64 {
        1000.0 / self.scale
    }

    /// Whether a seat is joined to its carrier by a straight landing line on this page.
    pub fn joined(&self, page: &Page, members: &[Member], member: usize, seat: usize, clear: f64) -> bool {
        let Some(Seat { at, on: Some((carrier, lands)) }) = members.get(member).and_then(|m| m.seats.get(seat))
        else {
            return false;
        };
        let (Some(upper), Some(lower)) = (page.find(member), page.find(*carrier)) else { return false };
        let x = upper.x + at * self.per_metre();
        let aligned = (x - (lower.x + lands * self.per_metre())).abs() < 1e-6;
        let crossed = page.placed.iter().any(|p| {
            let right = p.x + members.get(p.member).map_or(0.0, |m| m.length) * self.per_metre();
            p.row > upper.row && p.row < lower.row && x > p.x - clear && x < right + clear
        });
        aligned && upper.row < lower.row && !crossed
    }
}

/// Lays out these members (indices into `all`), in this order of preference from the top.
pub fn lay_out(all: &[Member], chosen: &[usize], paper: &Paper) -> Layout {
    lay_out_in(all, chosen, paper, paper.scales)
}

/// The same with scales of its own to choose from.
pub fn lay_out_in(all: &[Member], chosen: &[usize], paper: &Paper, scales: &[f64]) -> Layout {
    let longest = chosen.iter().map(|m| all[*m].length).fold(0.0, f64::max);
    let width = |scale: f64| paper.width * scale / 1000.0;
    // The first scale at which every connected part fits whole; else the first that the longest member fits.
    let whole = |scale: f64| {
        let offsets = Offsets::of(all, chosen, f64::INFINITY);
        offsets.widths(all, chosen).into_iter().all(|w| w <= width(scale))
    };
    let fitting = scales.iter().copied().find(|s| whole(*s));
    let least = scales.iter().copied().find(|s| longest <= width(*s));
    let scale = fitting.or(least).unwrap_or_else(|| longest * 1000.0 / paper.width);
    let offsets = Offsets::of(all, chosen, width(scale));
    let per_metre = 1000.0 / scale;
    let mut blocks = Vec::new();
    for cluster in offsets.clusters(chosen) {
        let left = cluster.iter().map(|m| offsets.x(*m)).fold(f64::INFINITY, f64::min);
        let rows = rows(all, &cluster, &offsets, paper, per_metre);
        let count = rows.iter().map(|r| r.1 + 1).max().unwrap_or(0);
        let placed: Vec<Placed> = rows
            .iter()
            .map(|(m, row)| Placed { member: *m, row: count - 1 - row, x: (offsets.x(*m) - left) * per_metre })
            .collect();
        blocks.extend(split(placed, count, paper.rows, all, per_metre));
    }
    Layout { scale, pages: packed(blocks, paper) }
}

/// Members whose bearings stand over their landings: places relative to each other, m.
struct Offsets {
    /// For each member its cluster's number and its place there.
    place: Vec<Option<(usize, f64)>>,
}

impl Offsets {
    /// Joins members along their landings, in order, as long as clusters stay within a width.
    fn of(all: &[Member], chosen: &[usize], width: f64) -> Offsets {
        let mut place = vec![None; all.len()];
        for (n, m) in chosen.iter().enumerate() {
            place[*m] = Some((n, 0.0));
        }
        let mut offsets = Offsets { place };
        for m in chosen {
            for seat in &all[*m].seats {
                let Some((carrier, lands)) = seat.on else { continue };
                let places = (offsets.place[*m], offsets.place.get(carrier).copied().flatten());
                let (Some((upper, x)), Some((lower, y))) = places else { continue };
                if upper == lower {
                    continue;
                }
                let shift = x + seat.at - (y + lands);
                let extent = |cluster: usize, shift: f64| offsets.extent(all, chosen, cluster, shift);
                let (a, b) = (extent(upper, 0.0), extent(lower, shift));
                if a.1.max(b.1) - a.0.min(b.0) > width + 1e-9 {
                    continue;
                }
                for n in chosen {
                    if let Some((cluster, at)) = &mut offsets.place[*n]
                        && *cluster == lower
                    {
                        *cluster = upper;
                        *at += shift;
                    }
                }
            }
        }
        offsets
    }

    fn extent(&self, all: &[Member], chosen: &[usize], cluster: usize, shift: f64) -> (f64, f64) {
        let inside = chosen.iter().filter_map(|m| match self.place[*m] {
            Some((c, at)) if c == cluster => Some((at + shift, at + shift + all[*m].length)),
            _ => None,
        });
        inside.fold((f64::INFINITY, f64::NEG_INFINITY), |e, m| (e.0.min(m.0), e.1.max(m.1)))
    }

    fn x(&self, member: usize) -> f64 {
        self.place.get(member).copied().flatten().map_or(0.0, |p| p.1)
    }

    /// Members of each cluster, clusters in order of their first member.
    fn clusters(&self, chosen: &[usize]) -> Vec<Vec<usize>> {
        let mut list: Vec<(usize, Vec<usize>)> = Vec::new();
        for m in chosen {
            let Some((cluster, _)) = self.place[*m] else { continue };
            match list.iter_mut().find(|c| c.0 == cluster) {
                Some((_, members)) => members.push(*m),
                None => list.push((cluster, vec![*m])),
            }
        }
        list.into_iter().map(|c| c.1).collect()
    }

    fn widths(&self, all: &[Member], chosen: &[usize]) -> Vec<f64> {
        let clusters = self.clusters(chosen);
        let extents = clusters.iter().map(|c| {
            let left = c.iter().map(|m| self.x(*m)).fold(f64::INFINITY, f64::min);
            c.iter().map(|m| self.x(*m) + all[*m].length).fold(f64::NEG_INFINITY, f64::max) - left
        });
        extents.collect()
    }
}

/// A row for each member of a cluster, counted from the ground; the best of several orders of placing.
fn rows(
    all: &[Member],
    cluster: &[usize],
    offsets: &Offsets,
    paper: &Paper,
    per_metre: f64,
) -> Vec<(usize, usize)> {
    let field = Field { all, cluster, offsets, paper, per_metre };
    let x = |m: &usize| offsets.x(*m);
    let end = |m: &usize| offsets.x(*m) + all[*m].length;
    let by = |key: &dyn Fn(&usize) -> f64| {
        let mut order = cluster.to_vec();
        order.sort_by(|a, b| key(a).total_cmp(&key(b)).then(a.cmp(b)));
        order
    };
    let mut orders = vec![cluster.to_vec(), by(&x), by(&|m| -x(m)), by(&end), by(&|m| -end(m))];
    orders.push(by(&|m| all[*m].length));
    orders.push(by(&|m| -all[*m].length));
    // Shuffled orders for tangled clusters; the seed is fixed, so that the same job gives the same drawing.
    let mut state: u64 = 0x2545_f491_4f6c_dd1d;
    let tries = if cluster.len() > 3 { 40 } else { 0 };
    for _ in 0..tries {
        let mut order = cluster.to_vec();
        for n in (1..order.len()).rev() {
            state ^= state << 13;
            state ^= state >> 7;
            state ^= state << 17;
            order.swap(n, (state % (n as u64 + 1)) as usize);
        }
        orders.push(order);
    }
    let mut best: Option<(usize, Vec<(usize, usize)>)> = None;
    for order in orders {
        let (cost, rows) = field.place(&order);
        if best.as_ref().is_none_or(|b| cost < b.0) {
            best = Some((cost, rows));
        }
    }
    best.map(|b| b.1).unwrap_or_default()
}

struct Field<'a> {
    all: &'a [Member],
    cluster: &'a [usize],
    offsets: &'a Offsets,
    paper: &'a Paper,
    per_metre: f64,
}

/// A landing line that is drawn: its place, and the rows of its ends.
struct LandingLine {
    x: f64,
    lower: usize,
    upper: usize,
}

impl Field<'_> {
    fn span(&self, member: usize) -> (f64, f64) {
        let x = self.offsets.x(member) * self.per_metre;
        (x, x + self.all[member].length * self.per_metre)
    }

    /// Carriers within the cluster that this member stands exactly over: place and carrier.
    fn exact(&self, member: usize) -> Vec<(f64, usize)> {
        let seats = self.all[member].seats.iter().filter_map(|seat| {
            let (carrier, lands) = seat.on?;
            let inside = self.cluster.contains(&carrier);
            let x = self.offsets.x(member) + seat.at;
            let aligned = (x - self.offsets.x(carrier) - lands).abs() * self.per_metre < 1e-6;
            (inside && aligned).then_some((x * self.per_metre, carrier))
        });
        seats.collect()
    }

    /// Carriers first, otherwise in the order given; each member as low as it finds room. The cost counts landings
    /// that had to be cut, then rows, then the lengths of landing lines.
    fn place(&self, order: &[usize]) -> (usize, Vec<(usize, usize)>) {
        let mut placed: Vec<(usize, usize)> = Vec::new();
        let mut lines: Vec<LandingLine> = Vec::new();
        let (mut cuts, mut reach) = (0, 0);
        let mut waiting = order.to_vec();
        while !waiting.is_empty() {
            let ready = waiting.iter().position(|m| {
                let carriers = self.all[*m].seats.iter().filter_map(|s| s.on);
                carriers.into_iter().all(|(c, _)| !waiting.contains(&c) || c == *m)
            });
            let member = waiting.remove(ready.unwrap_or(0));
            let carriers = self.exact(member);
            let row_of = |m: usize| placed.iter().find(|p| p.0 == m).map(|p| p.1);
            let lowest = self.all[member]
                .seats
                .iter()
                .filter_map(|s| s.on.and_then(|(c, _)| row_of(c)))
                .map(|row| row + 1)
                .max()
                .unwrap_or(0);
            let top = placed.iter().map(|p| p.1 + 1).max().unwrap_or(0).max(lowest);
            let clear = |row: usize| {
                carriers.iter().all(|(x, c)| row_of(*c).is_none_or(|lower| self.free(&placed, *x, lower, row)))
            };
            let room = |row: usize| self.room(&placed, &lines, member, row);
            let row = (lowest..=top).find(|r| room(*r) && clear(*r)).or((lowest..=top).find(|r| room(*r)));
            let row = row.unwrap_or(top);
            for (x, carrier) in &carriers {
                let Some(lower) = row_of(*carrier) else { continue };
                if self.free(&placed, *x, lower, row) {
                    lines.push(LandingLine { x: *x, lower, upper: row });
                    reach += row - lower;
                } else {
                    cuts += 1;
                }
            }
            placed.push((member, row));
        }
        let rows = placed.iter().map(|p| p.1 + 1).max().unwrap_or(0);
        (cuts * 10_000 + rows * 100 + reach, placed)
    }

    /// Whether an upright line between two rows passes no member.
    fn free(&self, placed: &[(usize, usize)], x: f64, lower: usize, upper: usize) -> bool {
        !placed.iter().any(|(m, row)| {
            let (left, right) = self.span(*m);
            *row > lower && *row < upper && x > left - self.paper.clear && x < right + self.paper.clear
        })
    }

    /// Whether a member fits into a row: beside those that stand there, and off the landing lines that pass.
    fn room(&self, placed: &[(usize, usize)], lines: &[LandingLine], member: usize, row: usize) -> bool {
        let (left, right) = self.span(member);
        let beside = placed.iter().filter(|p| p.1 == row).all(|(other, _)| {
            let (a, b) = self.span(*other);
            let apart = left >= b + self.paper.gap || a >= right + self.paper.gap;
            apart || self.back_to_back(member, *other)
        });
        let passed = lines.iter().any(|line| {
            line.lower < row
                && row < line.upper
                && line.x > left - self.paper.clear
                && line.x < right + self.paper.clear
        });
        beside && !passed
    }

    /// Two members that end over the same landing place, one on either side of it.
    fn back_to_back(&self, one: usize, other: usize) -> bool {
        let (a, b) = (self.span(one), self.span(other));
        let meet = if (a.1 - b.0).abs() < 1e-6 {
            a.1
        } else if (b.1 - a.0).abs() < 1e-6 {
            b.1
        } else {
            return false;
        };
        let lands = |m: usize| self.exact(m).into_iter().find(|(x, _)| (x - meet).abs() < 1e-6).map(|l| l.1);
        matches!((lands(one), lands(other)), (Some(p), Some(q)) if p == q)
    }
}

/// A part of a drawing that moves as a whole.
struct Block {
    placed: Vec<Placed>,
    rows: usize,
    width: f64,
}

/// Cuts a cluster that has too many rows.
fn split(placed: Vec<Placed>, count: usize, most: usize, all: &[Member], per_metre: f64) -> Vec<Block> {
    let most = most.max(1);
    let pieces = count.div_ceil(most).max(1);
    let each = count.div_ceil(pieces).max(1);
    let mut blocks = Vec::new();
    for piece in 0..pieces {
        let (first, last) = (piece * each, ((piece + 1) * each).min(count));
        let inside: Vec<Placed> = placed.iter().copied().filter(|p| (first..last).contains(&p.row)).collect();
        let left = inside.iter().map(|p| p.x).fold(f64::INFINITY, f64::min);
        let right = inside.iter().map(|p| p.x + all[p.member].length * per_metre).fold(f64::NEG_INFINITY, f64::max);
        if inside.is_empty() {
            continue;
        }
        let moved = inside.into_iter().map(|p| Placed { row: p.row - first, x: p.x - left, ..p });
        blocks.push(Block { placed: moved.collect(), rows: last - first, width: right - left });
    }
    blocks
}

/// Blocks side by side where they fit, then below each other, then on the next drawing.
fn packed(blocks: Vec<Block>, paper: &Paper) -> Vec<Page> {
    let mut pages: Vec<Page> = Vec::new();
    // The shelf that is being filled: its first row, its rows, the width taken.
    let (mut top, mut high, mut taken) = (0, 0, 0.0);
    for block in blocks {
        let beside = taken > 0.0 && taken + 2.0 * paper.gap + block.width <= paper.width && block.rows == high;
        if !beside {
            top += high;
            high = block.rows;
            taken = 0.0;
            if pages.is_empty() || top + block.rows > paper.rows.max(1) {
                pages.push(Page::default());
                top = 0;
            }
        }
        let left = if taken > 0.0 { taken + 2.0 * paper.gap } else { 0.0 };
        if let Some(page) = pages.last_mut() {
            page.placed.extend(block.placed.iter().map(|p| Placed { row: p.row + top, x: p.x + left, ..*p }));
            page.rows = page.rows.max(top + block.rows);
        }
        taken = left + block.width;
    }
    pages
}

/// Connected parts of a building: members that carry each other, each part in the order given.
pub fn connected(all: &[Member], order: &[usize]) -> Vec<Vec<usize>> {
    let mut part: Vec<usize> = (0..all.len()).collect();
    for (m, member) in all.iter().enumerate() {
        for (carrier, _) in member.seats.iter().filter_map(|s| s.on) {
            if let (Some(a), Some(b)) = (part.get(m).copied(), part.get(carrier).copied()) {
                part.iter_mut().filter(|p| **p == b).for_each(|p| *p = a);
            }
        }
    }
    let mut list: Vec<(usize, Vec<usize>)> = Vec::new();
    for m in order {
        match list.iter_mut().find(|(p, _)| *p == part[*m]) {
            Some((_, members)) => members.push(*m),
            None => list.push((part[*m], vec![*m])),
        }
    }
    list.into_iter().map(|p| p.1).collect()
}
