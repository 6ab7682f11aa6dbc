//! Where a user's settings, unsaved work and lives computed before are kept.

use directories::ProjectDirs;
use std::env;
use std::path::PathBuf;

/// Environment variable that names another folder for the settings.
pub const CONFIG_VARIABLE: &str = "LONGEMBER_CONFIG_DIR";
/// Environment variable that names another folder for recovery copies.
pub const STATE_VARIABLE: &str = "LONGEMBER_STATE_DIR";
/// Environment variable that names another folder for lives computed before.
pub const CACHE_VARIABLE: &str = "LONGEMBER_CACHE_DIR";

/// The folder of the settings; none on a machine without a home folder.
#[must_use]
pub fn config_folder() -> Option<PathBuf> {
    named_by(CONFIG_VARIABLE).or_else(|| project().map(|project| project.config_dir().to_owned()))
}

/// The folder of what should survive a crash; none on a machine without a home folder.
#[must_use]
pub fn state_folder() -> Option<PathBuf> {
    named_by(STATE_VARIABLE)
        .or_else(|| project().map(|project| project.state_dir().unwrap_or_else(|| project.data_local_dir()).to_owned()))
}

/// The folder of what can be computed again; none on a machine without a home folder.
#[must_use]
pub fn cache_folder() -> Option<PathBuf> {
    named_by(CACHE_VARIABLE).or_else(|| project().map(|project| project.cache_dir().to_owned()))
}

fn named_by(variable: &str) -> Option<PathBuf> {
    env::var_os(variable).filter(|value| !value.is_empty()).map(PathBuf::from)
}

fn project() -> Option<ProjectDirs> {
    ProjectDirs::from("", "", "Longember")
}
