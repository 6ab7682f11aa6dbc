//! Makes the grid of red-dwarf lives that comes with the program, from the structure calculation itself.
//!
//! ```text
//! cargo run --release --example red_dwarf_grid -- assets/tables/red_dwarf_grid.bin
//! ```
//!
//! Some 300 lives, about fifteen minutes of one core; a number after the name of the file says how many threads may
//! work at once. Nothing in it is random; on another machine the last digits may differ, far within the tolerances that
//! the quick look states and a test holds. Run it after every change of the structure calculation, together with a new
//! `STRUCTURE_VERSION`. It fails if any life but a brown dwarf's could not be followed to its end.

use longember::physics::star::convective::{
    ConvectiveError, ConvectiveInput, Ending, Options, Resolution, SurfaceOpacity, compute_with,
};
use longember::physics::star::quick_look::{GRID_MASSES_MSUN, GRID_METALLICITIES_DEX, GridLife, table_bytes};
use std::io::Write;
use std::ops::ControlFlow;
use std::process::ExitCode;
use std::sync::atomic::{AtomicUsize, Ordering};
use std::thread;

fn main() -> ExitCode {
    let mut arguments = std::env::args_os().skip(1);
    let Some(path) = arguments.next() else {
        say("name the file to write, such as assets/tables/red_dwarf_grid.bin");
        return ExitCode::from(2);
    };
    let asked = arguments.next().and_then(|count| count.to_str()?.parse().ok());
    let threads = asked.unwrap_or_else(|| thread::available_parallelism().map_or(1, usize::from));
    let (lives, missing) = lives(threads);
    let bytes = table_bytes(&lives);
    say(&format!("{} lives, {} bytes, {missing} missing", lives.len(), bytes.len()));
    match std::fs::write(&path, bytes) {
        Ok(()) if missing == 0 => ExitCode::SUCCESS,
        Ok(()) => ExitCode::FAILURE,
        Err(error) => {
            say(&error.to_string());
            ExitCode::from(4)
        }
    }
}

/// Every life of the grid in order, and how many could not be followed.
fn lives(threads: usize) -> (Vec<GridLife>, usize) {
    let mut wanted = Vec::new();
    for surface in [SurfaceOpacity::Modern, SurfaceOpacity::Of1997] {
        for metallicity_dex in GRID_METALLICITIES_DEX {
            wanted.extend(GRID_MASSES_MSUN.map(|mass_msun| (ConvectiveInput { mass_msun, metallicity_dex }, surface)));
        }
    }
    // Each thread takes the next star that nobody has begun; the order of the file is that of the list.
    let next = AtomicUsize::new(0);
    let work = || {
        let (mut done, mut missing) = (Vec::new(), 0);
        loop {
            let place = next.fetch_add(1, Ordering::Relaxed);
            let Some((input, surface)) = wanted.get(place) else { return (done, missing) };
            match life(*input, *surface) {
                Computed::Whole(life) => done.push((place, life)),
                Computed::BrownDwarf => {}
                Computed::Lost => missing += 1,
            }
        }
    };
    let parts: Vec<_> = thread::scope(|scope| {
        let workers: Vec<_> = (0..threads.max(1)).map(|_| scope.spawn(work)).collect();
        workers.into_iter().filter_map(|worker| worker.join().ok()).collect()
    });
    let missing = parts.iter().map(|(_, missing)| missing).sum();
    let mut lives: Vec<(usize, Box<GridLife>)> = parts.into_iter().flat_map(|(done, _)| done).collect();
    lives.sort_by_key(|(place, _)| *place);
    (lives.into_iter().map(|(_, life)| *life).collect(), missing)
}

/// What came of one star.
enum Computed {
    /// A life to the black dwarf.
    Whole(Box<GridLife>),
    /// No star.
    BrownDwarf,
    /// The structure could not be followed to the end.
    Lost,
}

fn life(input: ConvectiveInput, surface: SurfaceOpacity) -> Computed {
    let options = Options { resolution: Resolution::Standard, surface };
    let computed = compute_with(input, options, &mut |_| ControlFlow::Continue(()));
    let label = format!("{} solar masses, {} dex, {surface:?}", input.mass_msun, input.metallicity_dex);
    match computed {
        Ok(life) if life.ending == Ending::BlackDwarf => {
            say(&format!("{label}: {} moments", life.nodes.len()));
            Computed::Whole(Box::new(GridLife { input, surface, life }))
        }
        Ok(life) => {
            say(&format!("{label}: LOST after {} moments", life.nodes.len()));
            Computed::Lost
        }
        Err(error @ ConvectiveError::BrownDwarf { .. }) => {
            say(&format!("{label}: left out, {error}"));
            Computed::BrownDwarf
        }
        Err(error) => {
            say(&format!("{label}: LOST, {error}"));
            Computed::Lost
        }
    }
}

/// Writes a line of progress; nothing is lost when nobody reads it.
fn say(line: &str) {
    let _ = writeln!(std::io::stderr(), "{line}");
}
