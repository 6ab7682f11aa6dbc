//! Work off the drawing thread: one history at a time, the newest request wins.

use crate::system::{History, HistoryError, System};
use std::sync::Arc;
use std::sync::mpsc::{Receiver, RecvTimeoutError, channel};
use std::thread;
use std::time::Duration;

/// A computed history, or why there is none.
pub type Computed = Result<Arc<History>, HistoryError>;

/// Most of a frame that the drawing thread waits, so that a quick result shows without a flicker.
const SHORT_WAIT: Duration = Duration::from_millis(6);

/// The history being computed in the background.
#[derive(Debug, Default)]
pub struct HistoryJob {
    running: Option<Receiver<Computed>>,
}

impl HistoryJob {
    /// Starts computing; the result of an earlier request is dropped when it comes.
    pub fn start(&mut self, system: System, context: &egui::Context) {
        let (sender, receiver) = channel();
        let context = context.clone();
        let spawned = thread::Builder::new().name("history".to_owned()).spawn(move || {
            // The window may have asked for something newer and stopped listening: nothing is lost then.
            let _ = sender.send(History::compute(system).map(Arc::new));
            context.request_repaint();
        });
        self.running = spawned.ok().map(|_| receiver);
    }

    /// Whether something is being computed.
    #[must_use]
    pub fn is_running(&self) -> bool {
        self.running.is_some()
    }

    /// Forgets what is being computed.
    pub fn cancel(&mut self) {
        self.running = None;
    }

    /// The result, once it is there.
    pub fn poll(&mut self) -> Option<Computed> {
        let found = self.running.as_ref()?.recv_timeout(SHORT_WAIT);
        match found {
            Ok(computed) => {
                self.running = None;
                Some(computed)
            }
            Err(RecvTimeoutError::Timeout) => None,
            Err(RecvTimeoutError::Disconnected) => {
                self.running = None;
                None
            }
        }
    }
}
