//! Writing files whole or not at all.

use std::io::{self, Write};
use std::path::Path;

/// Writes beside the target under a name of its own and renames: the file is there whole, or as it was before.
pub fn write_whole(path: &Path, content: &[u8]) -> io::Result<()> {
    let folder = match path.parent() {
        Some(parent) if !parent.as_os_str().is_empty() => parent,
        _ => Path::new("."),
    };
    let mut file = tempfile::Builder::new().prefix(".sagledger-").tempfile_in(folder)?;
    file.write_all(content)?;
    file.as_file().sync_all()?;
    #[cfg(unix)]
    {
        use std::os::unix::fs::PermissionsExt;
        // Temporary files are private; a package is read like any other file.
        let mode = std::fs::metadata(path).map(|m| m.permissions().mode()).unwrap_or(0o644);
        file.as_file().set_permissions(std::fs::Permissions::from_mode(mode))?;
    }
    file.persist(path).map_err(|error| error.error)?;
    Ok(())
}

#[cfg(test)]
mod tests {
    use super::write_whole;

    #[test]
    fn a_file_is_replaced_whole_and_nothing_is_left_beside_it() {
        let folder = tempfile::tempdir().unwrap();
        let target = folder.path().join("draft.pdf");
        write_whole(&target, b"one").unwrap();
        write_whole(&target, b"two").unwrap();
        assert_eq!(std::fs::read(&target).unwrap(), b"two");
        assert_eq!(std::fs::read_dir(folder.path()).unwrap().count(), 1);
        assert!(write_whole(&folder.path().join("no/such/folder.pdf"), b"x").is_err());
    }
}
