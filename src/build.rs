//! Makes the program's identity: a digest of its sources, `Cargo.lock`, templates, catalogue and fonts.

use sha2::{Digest, Sha256};
use std::fs;
use std::io;
use std::path::{Path, PathBuf};

const ROOTS: [&str; 4] = ["Cargo.lock", "src", "templates", "fonts"];

fn main() -> io::Result<()> {
    let base = PathBuf::from(std::env::var_os("CARGO_MANIFEST_DIR").unwrap_or_default());
    let mut files = Vec::new();
    for root in ROOTS {
        println!("cargo::rerun-if-changed={root}");
        collect(&base.join(root), &mut files)?;
    }
    // The order of a folder's entries differs between machines; the names decide it here.
    let mut named: Vec<(String, PathBuf)> = files
        .into_iter()
        .map(|path| {
            let parts = path.strip_prefix(&base).unwrap_or(&path).components();
            let name: Vec<_> = parts.map(|part| part.as_os_str().to_string_lossy().into_owned()).collect();
            (name.join("/"), path)
        })
        .collect();
    named.sort();
    let mut digest = Sha256::new();
    for (name, path) in named {
        let content = fs::read(&path)?;
        digest.update((name.len() as u64).to_le_bytes());
        digest.update(name.as_bytes());
        digest.update((content.len() as u64).to_le_bytes());
        digest.update(&content);
    }
    let identity: String = digest.finalize().iter().map(|byte| format!("{byte:02x}")).collect();
    println!("cargo::rustc-env=SAGLEDGER_IDENTITY={identity}");
    Ok(())
}

fn collect(path: &Path, files: &mut Vec<PathBuf>) -> io::Result<()> {
    if path.is_dir() {
        for entry in fs::read_dir(path)? {
            collect(&entry?.path(), files)?;
        }
    } else if path.is_file() {
        files.push(path.to_path_buf());
    }
    Ok(())
}
