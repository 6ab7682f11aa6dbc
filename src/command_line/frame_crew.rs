//! Draws and writes the frames of a show on every core, keeping those that are there already.

use super::trouble::Trouble;
use crate::document::{WriteError, create_atomically, write_atomically};
use crate::drawing::frames::{FrameFormat, FrameSequence, Shape, encode, is_kept};
use crate::system::cues::ShowFrame;
use std::fs;
use std::io;
use std::path::{Path, PathBuf};
use std::sync::atomic::{AtomicBool, AtomicUsize, Ordering};
use std::sync::mpsc::{Sender, channel};
use std::thread;

/// A job for the crew.
#[derive(Debug)]
pub(super) struct FrameJob<'a> {
    pub(super) sequence: &'a FrameSequence<'a>,
    pub(super) frames: &'a [ShowFrame],
    pub(super) folder: &'a Path,
    pub(super) format: FrameFormat,
    pub(super) shape: Shape,
    pub(super) width_px: u32,
    /// Whether files of other sequences may be replaced.
    pub(super) force: bool,
}

/// What came of a whole job.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub(super) struct Tally {
    /// Frames drawn now.
    pub(super) drawn: usize,
    /// Good frames that were there.
    pub(super) kept: usize,
    /// Drawn frames in which there is nothing to see.
    pub(super) empty: usize,
}

/// What came of one frame.
enum Done {
    Drawn { is_seen: bool },
    Kept,
}

impl FrameJob<'_> {
    /// Draws every frame that is not there yet. `tell` is told how many are done; the first trouble ends the job, and
    /// what is written by then stays.
    pub(super) fn carry_out(&self, mut tell: impl FnMut(usize)) -> Result<Tally, Trouble> {
        let cores = thread::available_parallelism().map_or(1, usize::from).min(self.frames.len().max(1));
        let (next, has_trouble) = (AtomicUsize::new(0), AtomicBool::new(false));
        let (sender, receiver) = channel();
        thread::scope(|scope| {
            for _ in 0..cores {
                let sender = sender.clone();
                let (next, has_trouble) = (&next, &has_trouble);
                scope.spawn(move || self.work(next, has_trouble, &sender));
            }
            // Only the workers hold senders now, so that the loop ends with them.
            drop(sender);
            let mut tally = Tally::default();
            let mut trouble = None;
            for done in receiver {
                match done {
                    Ok(Done::Drawn { is_seen }) => {
                        tally.drawn += 1;
                        tally.empty += usize::from(!is_seen);
                    }
                    Ok(Done::Kept) => tally.kept += 1,
                    Err(first) => {
                        trouble.get_or_insert(first);
                    }
                }
                tell(tally.drawn + tally.kept);
            }
            trouble.map_or(Ok(tally), Err)
        })
    }

    fn work(&self, next: &AtomicUsize, has_trouble: &AtomicBool, sender: &Sender<Result<Done, Trouble>>) {
        while !has_trouble.load(Ordering::Relaxed) {
            let Some(frame) = self.frames.get(next.fetch_add(1, Ordering::Relaxed)) else { return };
            let done = self.one(frame);
            if done.is_err() {
                has_trouble.store(true, Ordering::Relaxed);
            }
            if sender.send(done).is_err() {
                return;
            }
        }
    }

    /// The file of a frame.
    fn path(&self, frame: &ShowFrame) -> PathBuf {
        self.folder.join(format!("frame_{:06}.{}", frame.number, self.format.extension()))
    }

    fn one(&self, frame: &ShowFrame) -> Result<Done, Trouble> {
        let path = self.path(frame);
        let fingerprint = self.sequence.fingerprint(frame.time_yr);
        let is_there = match fs::read(&path) {
            Ok(bytes) if is_kept(&bytes, self.format, self.shape.sides_px(self.width_px), &fingerprint) => {
                return Ok(Done::Kept);
            }
            Ok(_) => true,
            Err(error) if error.kind() == io::ErrorKind::NotFound => false,
            Err(source) => return Err(Trouble::Write(WriteError::Unwritable { path, source })),
        };
        if is_there && !self.force {
            return Err(Trouble::OtherFrame { path });
        }
        let (raster, is_seen) = self.sequence.frame(frame.time_yr)?;
        let bytes = encode(&raster, self.format, &fingerprint)?;
        if is_there {
            write_atomically(&path, &bytes)?;
        } else {
            create_atomically(&path, &bytes)?;
        }
        Ok(Done::Drawn { is_seen })
    }
}
