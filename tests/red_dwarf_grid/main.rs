//! Makes the grid of red-dwarf lives that comes with the program, from the structure calculation itself.
//!
//! ```text
//! cargo run --release --example red_dwarf_grid -- assets/tables/red_dwarf_grid.bin
//! ```
//!
//! Some 180 lives, about twenty minutes of one core. Nothing in it is random; on another machine the last digits may
//! differ, far within the tolerances that the quick look states and a test holds. Run it after every change of the
//! structure calculation, together with a new `STRUCTURE_VERSION`.

use longember::physics::star::convective::{
    ConvectiveError, ConvectiveInput, Options, Resolution, SurfaceOpacity, compute_with,
};
use longember::physics::star::quick_look::{GRID_MASSES_MSUN, GRID_METALLICITIES_DEX, GridLife, table_bytes};
use std::io::Write;
use std::ops::ControlFlow;
use std::process::ExitCode;
use std::sync::atomic::{AtomicUsize, Ordering};
use std::thread;

fn main() -> ExitCode {
    let Some(path) = std::env::args_os().nth(1) else {
        say("name the file to write, such as assets/tables/red_dwarf_grid.bin");
        return ExitCode::from(2);
    };
    let bytes = table_bytes(&lives());
    say(&format!("{} bytes", bytes.len()));
    match std::fs::write(&path, bytes) {
        Ok(()) => ExitCode::SUCCESS,
        Err(error) => {
            say(&error.to_string());
            ExitCode::from(4)
        }
    }
}

fn lives() -> Vec<GridLife> {
    let mut wanted = Vec::new();
    for surface in [SurfaceOpacity::Modern, SurfaceOpacity::Of1997] {
        for metallicity_dex in GRID_METALLICITIES_DEX {
            if surface == SurfaceOpacity::Modern || metallicity_dex == 0.0 {
                wanted.extend(
                    GRID_MASSES_MSUN.map(|mass_msun| (ConvectiveInput { mass_msun, metallicity_dex }, surface)),
                );
            }
        }
    }
    // Each thread takes the next star that nobody has begun; the order of the file is that of the list.
    let next = AtomicUsize::new(0);
    let work = || {
        let mut done = Vec::new();
        loop {
            let place = next.fetch_add(1, Ordering::Relaxed);
            let Some((input, surface)) = wanted.get(place) else { return done };
            done.extend(life(*input, *surface).map(|life| (place, life)));
        }
    };
    let mut lives: Vec<(usize, GridLife)> = thread::scope(|scope| {
        let count = thread::available_parallelism().map_or(1, usize::from);
        let threads: Vec<_> = (0..count).map(|_| scope.spawn(work)).collect();
        threads.into_iter().filter_map(|thread| thread.join().ok()).flatten().collect()
    });
    lives.sort_by_key(|(place, _)| *place);
    lives.into_iter().map(|(_, life)| life).collect()
}

fn life(input: ConvectiveInput, surface: SurfaceOpacity) -> Option<GridLife> {
    let options = Options { resolution: Resolution::Standard, surface };
    let computed = compute_with(input, options, &mut |_| ControlFlow::Continue(()));
    let label = format!("{} solar masses, {} dex, {surface:?}", input.mass_msun, input.metallicity_dex);
    match computed {
        Ok(life) => {
            say(&format!("{label}: {:?}", life.ending));
            Some(GridLife { input, surface, life })
        }
        Err(error @ ConvectiveError::BrownDwarf { .. }) => {
            say(&format!("{label}: left out, {error}"));
            None
        }
        Err(error) => {
            say(&format!("{label}: LEFT OUT, {error}"));
            None
        }
    }
}

/// Writes a line of progress; nothing is lost when nobody reads it.
fn say(line: &str) {
    let _ = writeln!(std::io::stderr(), "{line}");
}
