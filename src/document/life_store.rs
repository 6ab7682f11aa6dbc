//! Exact lives of red dwarfs, kept between runs so that the seconds they take are spent once.

use super::files::{read_bytes, write_atomically};
use super::life_form::{decoded, encoded};
use super::user_folders::cache_folder;
use crate::physics::star::convective::{Life, SurfaceOpacity};
use crate::physics::star::{LifeOptions, STRUCTURE_VERSION, StarInput, WholeLife};
use crate::system::history::{life_options, star_input};
use crate::system::{History, HistoryError, System};
use std::fs;
use std::ops::ControlFlow;
use std::path::PathBuf;
use std::sync::Arc;
use std::time::SystemTime;

/// Most lives that are kept; the oldest make room.
const MOST_LIVES: usize = 100;
const EXTENSION: &str = "life";

/// Where exact lives are kept. What cannot be read or written there is computed anew: nothing depends on it.
#[derive(Clone, Debug, Default)]
pub struct LifeStore {
    folder: Option<PathBuf>,
}

impl LifeStore {
    /// The store in the user's cache folder; one that keeps nothing where there is no such folder.
    #[must_use]
    pub fn of_user() -> Self {
        Self { folder: cache_folder().map(|folder| folder.join("lives")) }
    }

    /// A store in a folder of its own.
    #[must_use]
    pub fn at(folder: PathBuf) -> Self {
        Self { folder: Some(folder) }
    }

    /// Computes the exact history of a system, or takes the star's life from the store; `earlier` as in
    /// [`History::compute_after`].
    ///
    /// # Errors
    /// As [`History::compute_with`].
    pub fn history(
        &self,
        earlier: Option<&History>,
        system: System,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<History, HistoryError> {
        let (input, options) = (star_input(&system), life_options(&system));
        if !WholeLife::needs_structure(input.mass_msun) || !system.problems().is_empty() {
            return History::compute_after(earlier, system, progress);
        }
        if let Some(life) = earlier.and_then(|earlier| earlier.life_of(&system)) {
            return History::of_life(earlier, system, life, progress);
        }
        let life = if let Some(life) = self.find(input, options) {
            life
        } else {
            let life = WholeLife::structure(input, options, &mut |share| progress(0.98 * share))?;
            self.keep(input, options, &life);
            life
        };
        let life = Arc::new(WholeLife::of_structure(input, options, &life)?);
        History::of_life(earlier, system, life, progress)
    }

    /// The life kept for a star.
    #[must_use]
    pub fn find(&self, input: StarInput, options: LifeOptions) -> Option<Life> {
        decoded(&read_bytes(&self.path(input, options)?).ok()?)
    }

    /// Keeps the life of a star.
    pub fn keep(&self, input: StarInput, options: LifeOptions, life: &Life) {
        let (Some(folder), Some(path)) = (&self.folder, self.path(input, options)) else { return };
        if fs::create_dir_all(folder).is_ok() && write_atomically(&path, &encoded(life)).is_ok() {
            self.make_room();
        }
    }

    fn path(&self, input: StarInput, options: LifeOptions) -> Option<PathBuf> {
        let surface = match options.surface {
            SurfaceOpacity::Modern => "modern",
            SurfaceOpacity::Of1997 => "of1997",
        };
        let name = format!(
            "{STRUCTURE_VERSION}_{}_{}_{surface}.{EXTENSION}",
            input.mass_msun,
            // Zero has two signs, which mean one star.
            input.metallicity_dex + 0.0
        );
        Some(self.folder.as_ref()?.join(name))
    }

    fn make_room(&self) {
        let entries = self.folder.iter().filter_map(|folder| fs::read_dir(folder).ok()).flatten().flatten();
        let mut lives: Vec<(SystemTime, PathBuf)> = entries
            .filter(|entry| entry.path().extension().is_some_and(|extension| extension == EXTENSION))
            .filter_map(|entry| Some((entry.metadata().ok()?.modified().ok()?, entry.path())))
            .collect();
        lives.sort();
        for (_, path) in lives.iter().take(lives.len().saturating_sub(MOST_LIVES)) {
            // Another window may have removed it first.
            let _ = fs::remove_file(path);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::StarSpecification;

    fn red_dwarf() -> System {
        System { star: StarSpecification { mass_msun: 0.1, ..StarSpecification::default() }, planets: Vec::new() }
    }

    #[test]
    fn a_life_is_computed_once() {
        let folder = tempfile::tempdir().expect("a folder");
        let store = LifeStore::at(folder.path().join("deep").join("lives"));
        let mut steps = 0;
        let mut count = |_: f64| {
            steps += 1;
            ControlFlow::Continue(())
        };
        let first = store.history(None, red_dwarf(), &mut count).expect("a history");
        let second =
            store.history(None, red_dwarf(), &mut |_| ControlFlow::Break(())).expect("nothing left to compute");
        assert!(steps > 100, "{steps}");
        assert_eq!(first.events(), second.events());
        assert_eq!(first.star_at(3.9e12), second.star_at(3.9e12));
        // A file that is damaged is as good as none.
        let path = store.path(star_input(&red_dwarf()), LifeOptions::default()).expect("a path");
        let mut bytes = fs::read(&path).expect("kept");
        bytes.truncate(bytes.len() / 2);
        fs::write(&path, bytes).expect("written");
        assert!(store.find(star_input(&red_dwarf()), LifeOptions::default()).is_none());
        let stopped = store.history(None, red_dwarf(), &mut |_| ControlFlow::Break(()));
        assert!(matches!(stopped, Err(HistoryError::Cancelled)));
    }

    #[test]
    fn other_stars_and_surfaces_have_files_of_their_own() {
        let store = LifeStore::at(PathBuf::from("lives"));
        let star = |mass_msun, metallicity_dex| StarInput { mass_msun, metallicity_dex };
        let modern = LifeOptions::default();
        let of_1997 = LifeOptions { surface: SurfaceOpacity::Of1997 };
        let paths = [
            store.path(star(0.1, 0.0), modern),
            store.path(star(0.1, 0.0), of_1997),
            store.path(star(0.1, 0.1), modern),
            store.path(star(0.100_000_000_000_000_02, 0.0), modern),
        ];
        let distinct: std::collections::HashSet<_> = paths.iter().collect();
        assert_eq!(distinct.len(), paths.len());
        assert_eq!(store.path(star(0.1, -0.0), modern), store.path(star(0.1, 0.0), modern));
    }
}
