//! Which program this is: its version, and a digest of everything that decides what it prints.

pub const NAME: &str = "sagledger";
pub const VERSION: &str = env!("CARGO_PKG_VERSION");
/// SHA-256 over the program's sources, `Cargo.lock`, templates, catalogue and fonts, made when it is built: equal
/// identities promise equal bytes.
pub const IDENTITY: &str = env!("SAGLEDGER_IDENTITY");
/// Version of the catalogue of sections: it changes with any dimension.
pub const CATALOGUE: &str = "EN 10365 UB and UC, 1";
