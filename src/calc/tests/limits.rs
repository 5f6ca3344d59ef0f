//! Which deflection limits are in force, and what the named sets say.

use sagledger_calc::limits::{Bound, Limit, LimitFrom, LimitSet, LimitTable, Movement, in_force};
use sagledger_calc::quantity::Length;

use Movement::{After, Stacked, Tilt, Total, Variable};

/// "span/250", "10 mm", "1/500".
fn bound(spelled: &str) -> Bound {
    let number = |text: &str| -> f64 { text.parse().expect("a number") };
    match (spelled.strip_prefix("span/"), spelled.strip_prefix("1/"), spelled.strip_suffix(" mm")) {
        (Some(n), ..) => Bound::SpanOver(number(n)),
        (_, Some(n), _) => Bound::OneIn(number(n)),
        (.., Some(mm)) => Bound::Length(Length::mm(number(mm))),
        _ => panic!("{spelled}"),
    }
}

/// "span/500 or 10 mm": the tightest governs.
fn bounds(spelled: &str) -> Vec<Bound> {
    spelled.split(" or ").map(bound).collect()
}

fn table(set: Option<LimitSet>, single: &[(Movement, &str)]) -> LimitTable {
    let single = single.iter().map(|(movement, spelled)| (*movement, bounds(spelled))).collect();
    LimitTable { set, single, reason: None }
}

fn given() -> LimitFrom {
    LimitFrom::Given { reason: None }
}

struct Case {
    what: &'static str,
    beam: LimitTable,
    job: LimitTable,
    defaulted: bool,
    /// Movement, bounds, where from; the stacked limit that is the total's says so.
    expected: Vec<(Movement, &'static str, LimitFrom)>,
}

/// The order in force is that of the design of the job file: the beam's own single limits, then the beam's set, then
/// the job's single limits, then the job's set, which counts only if the beam names none.
fn cases() -> Vec<Case> {
    let set = LimitFrom::Set;
    let as_total = |from: LimitFrom| LimitFrom::SameAsTotal(Box::new(from));
    let silent = LimitTable::default;
    use LimitSet::{BrittleFinish, GlazedDoors, Masonry, NoFinish, TimberFloor};
    vec![
        Case {
            what: "nobody said anything",
            beam: silent(),
            job: silent(),
            defaulted: true,
            expected: vec![
                (Total, "span/250", set(BrittleFinish)),
                (Variable, "span/360", set(BrittleFinish)),
                (Stacked, "span/250", as_total(set(BrittleFinish))),
            ],
        },
        Case {
            what: "the job's set",
            beam: silent(),
            job: table(Some(TimberFloor), &[]),
            defaulted: false,
            expected: vec![
                (Total, "span/250 or 14 mm", set(TimberFloor)),
                (Variable, "span/360", set(TimberFloor)),
                (Stacked, "span/250 or 14 mm", as_total(set(TimberFloor))),
            ],
        },
        Case {
            what: "the job's single limits before its set",
            beam: silent(),
            job: table(Some(NoFinish), &[(Total, "span/300"), (Tilt, "1/400")]),
            defaulted: false,
            expected: vec![
                (Total, "span/300", given()),
                (Variable, "span/200", set(NoFinish)),
                (Stacked, "span/300", as_total(given())),
                (Tilt, "1/400", given()),
            ],
        },
        Case {
            what: "the beam's set replaces the job's, not the job's single limits for what it leaves free",
            beam: table(Some(GlazedDoors), &[]),
            job: table(Some(Masonry), &[(Total, "span/325"), (After, "8 mm")]),
            defaulted: false,
            expected: vec![
                (Total, "span/325", given()),
                (After, "span/500 or 5 mm", set(GlazedDoors)),
                (Stacked, "span/325", as_total(given())),
            ],
        },
        Case {
            what: "the beam's single limits before everything",
            beam: table(Some(Masonry), &[(Total, "span/360 or 12 mm"), (Stacked, "15 mm"), (Tilt, "1/750")]),
            job: table(Some(NoFinish), &[(Total, "span/300"), (Stacked, "20 mm"), (Variable, "span/500")]),
            defaulted: false,
            expected: vec![
                (Total, "span/360 or 12 mm", given()),
                (After, "span/500 or 10 mm", set(Masonry)),
                (Variable, "span/360", set(Masonry)),
                (Stacked, "15 mm", given()),
                (Tilt, "1/750", given()),
            ],
        },
        Case {
            what: "a beam with single limits only keeps the job's set",
            beam: table(None, &[(Variable, "span/1000")]),
            job: table(Some(Masonry), &[]),
            defaulted: false,
            expected: vec![
                (Total, "span/250", set(Masonry)),
                (After, "span/500 or 10 mm", set(Masonry)),
                (Variable, "span/1000", given()),
                (Stacked, "span/250", as_total(set(Masonry))),
                (Tilt, "1/500", set(Masonry)),
            ],
        },
        Case {
            what: "a stacked limit of the job stays beside a total of the beam",
            beam: table(None, &[(Total, "span/500")]),
            job: table(None, &[(Stacked, "18 mm")]),
            defaulted: false,
            expected: vec![(Total, "span/500", given()), (Stacked, "18 mm", given())],
        },
        Case {
            what: "one limit anywhere, and nothing is taken by default; without a total nothing is stacked",
            beam: silent(),
            job: table(None, &[(Variable, "span/360")]),
            defaulted: false,
            expected: vec![(Variable, "span/360", given())],
        },
    ]
}

#[test]
fn limits_in_force_follow_their_order() {
    for case in cases() {
        let limits = in_force(&case.beam, &case.job);
        assert_eq!(limits.defaulted, case.defaulted, "{}", case.what);
        let expected = case.expected.into_iter();
        let expected: Vec<Limit> =
            expected.map(|(movement, spelled, from)| Limit { movement, bounds: bounds(spelled), from }).collect();
        assert_eq!(limits.limits, expected, "{}", case.what);
    }
}

#[test]
fn reasons_travel_with_the_table_that_gave_them() {
    let with = |reason: &str, movement| LimitTable {
        reason: Some(reason.into()),
        ..table(None, &[(movement, "span/400")])
    };
    let limits = in_force(&with("the rail of the hoist", Total), &with("the client's wish", Variable)).limits;
    let from = |reason: &str| LimitFrom::Given { reason: Some(reason.into()) };
    assert_eq!(limits.len(), 3);
    assert_eq!(limits[0].from, from("the rail of the hoist"));
    assert_eq!(limits[1].from, from("the client's wish"));
    assert_eq!(limits[2].from, LimitFrom::SameAsTotal(Box::new(from("the rail of the hoist"))));
}

#[test]
fn named_sets_say_what_they_limit_why_and_whence() {
    // Variable span/360 and span/200: EN 1993-1-1 UK NA.2.23; everything else is common practice.
    let advised = "EN 1993-1-1, UK NA.2.23";
    let expected = [
        ("brittle finish", vec![(Total, "span/250", "common practice"), (Variable, "span/360", advised)]),
        (
            "masonry",
            vec![
                (Total, "span/250", "common practice"),
                (After, "span/500 or 10 mm", "common practice"),
                (Variable, "span/360", advised),
                (Tilt, "1/500", "common practice"),
            ],
        ),
        ("glazed doors", vec![(After, "span/500 or 5 mm", "common practice")]),
        ("timber floor", vec![(Total, "span/250 or 14 mm", "common practice"), (Variable, "span/360", advised)]),
        ("no finish", vec![(Total, "span/200", "common practice"), (Variable, "span/200", advised)]),
    ];
    for (set, (name, limits)) in LimitSet::ALL.into_iter().zip(expected) {
        assert_eq!(set.name(), name);
        let found: Vec<(Movement, Vec<Bound>, &str)> =
            set.limits().into_iter().map(|(movement, bounds)| (movement, bounds, set.source(movement))).collect();
        let wanted: Vec<(Movement, Vec<Bound>, &str)> =
            limits.into_iter().map(|(movement, spelled, source)| (movement, bounds(spelled), source)).collect();
        assert_eq!(found, wanted, "{name}");
        for (movement, ..) in found {
            assert!(!set.reason(movement).is_empty(), "{name}");
        }
    }
}
