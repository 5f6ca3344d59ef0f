//! The standards that the calculation follows, with their editions (from memory).

/// One standard in one edition.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Standard {
    pub edition: &'static str,
    pub about: &'static str,
}

/// In the order in which they are used. Each comes with its UK National Annex where the UK choices apply.
pub const STANDARDS: [Standard; 4] = [
    Standard { edition: "EN 1990:2002+A1:2005", about: "actions combined" },
    Standard { edition: "EN 1991-1-1:2002", about: "imposed loads" },
    Standard { edition: "EN 1993-1-1:2005+A1:2014", about: "steel beams" },
    Standard { edition: "EN 1993-1-5:2006+A2:2019", about: "webs" },
];
