//! Finding sections by name, and what is offered where a name is not found.

use sagledger_calc::sections::{self, catalogue, find, nearest};

#[test]
fn every_spelling_of_every_name_finds_its_section() {
    for section in catalogue() {
        let name = section.name;
        let spellings = [
            name.to_string(),
            name.to_lowercase(),
            name.replace('x', "×"),
            name.replace('x', " X "),
            name.replace(' ', ""),
            format!("  {name} "),
        ];
        for spelling in spellings {
            assert_eq!(find(&spelling).map(|s| s.name), Some(name), "{spelling:?}");
        }
    }
}

#[test]
fn other_texts_find_nothing() {
    let texts = [
        "",
        " ",
        "UB",
        "254x146x37",
        "254x146x37 UC",
        "254x146x38 UB",
        "IPE 300",
        "254x146x37 UBB",
        "254.0x146x37 UB",
        "×",
    ];
    for text in texts {
        assert_eq!(find(text), None, "{text:?}");
    }
}

#[test]
fn near_names_are_what_was_likely_meant() {
    // What was typed, and what is offered first.
    let cases = [
        ("254x146x38 UB", "254x146x37 UB"),
        ("254x146x37", "254x146x37 UB"),
        ("254x146x37 UC", "254x146x37 UB"),
        ("UB 254x146x37", "254x146x37 UB"),
        ("203x203x46 UB", "203x203x46 UC"),
        ("203x133x24UB", "203x133x25 UB"),
        ("152x152x25 uc", "152x152x23 UC"),
        ("533x210x29 UB", "533x210x92 UB"),
        ("245x102x25 UB", "254x102x25 UB"),
        ("457×191×68 UB", "457x191x67 UB"),
        ("1016x305x437 UB", "1016x305x438 UB"),
        ("533x312x273 UB", "533x312x272 UB"),
        ("533x165x75 UB", "533x165x74 UB"),
    ];
    for (typed, first) in cases {
        let near = nearest(typed);
        assert_eq!(near.first(), Some(&first), "{typed}: {near:?}");
        assert!(near.len() <= 3, "{typed}: {near:?}");
        assert!(near.iter().all(|name| find(name).is_some()), "{typed}: {near:?}");
    }
}

#[test]
fn nothing_is_offered_where_nothing_is_near() {
    for text in ["", "x", "oak", "IPE 300", "timber 75 x 225 mm C24", &"9".repeat(100_000)] {
        assert_eq!(nearest(text), Vec::<&str>::new(), "{:.20}", text);
    }
}

#[test]
fn families_have_the_names_that_end_their_sections() {
    let names: Vec<&str> = sections::Family::ALL.into_iter().map(sections::Family::name).collect();
    assert_eq!(names, ["UB", "UC"]);
}
