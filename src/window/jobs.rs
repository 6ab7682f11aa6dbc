//! Work off the drawing thread: one history at a time, the newest request wins; and what is handed over.

use super::derived::Derived;
use super::exports::{Exported, Work};
use super::view::View;
use crate::document::LifeStore;
use crate::figure::curves::Curve;
use crate::system::{History, HistoryError, System, TimeScale};
use std::ops::ControlFlow;
use std::sync::Arc;
use std::sync::atomic::{AtomicBool, AtomicU32, Ordering};
use std::sync::mpsc::{Receiver, RecvTimeoutError, TryRecvError, channel};
use std::thread;
use std::time::Duration;

/// A computed history with what is drawn of it, or why there is none.
pub(crate) type Computed = Result<Fresh, HistoryError>;

/// A history with what is drawn of it, both made away from the drawing thread.
#[derive(Debug)]
pub(crate) struct Fresh {
    pub(crate) history: Arc<History>,
    pub(crate) derived: Box<Derived>,
}

/// What is to be computed, and how it is looked at.
#[derive(Debug)]
pub(crate) struct Request {
    pub(crate) system: System,
    /// The history on show, which has most in common with the one that is wanted.
    pub(crate) earlier: Arc<History>,
    pub(crate) scale: TimeScale,
    pub(crate) view: View,
    pub(crate) curves: Vec<Curve>,
}

impl Request {
    fn fresh(&self, history: History) -> Fresh {
        let history = Arc::new(history);
        Fresh { derived: Box::new(Derived::new(&history, self.scale, self.view, &self.curves)), history }
    }
}

/// Most of a frame that the drawing thread waits, so that a quick result shows without a flicker.
const SHORT_WAIT: Duration = Duration::from_millis(6);

/// The history being computed in the background.
#[derive(Debug, Default)]
pub(crate) struct HistoryJob {
    store: LifeStore,
    running: Option<Running>,
}

/// A computation with what it shares with its thread.
#[derive(Debug)]
struct Running {
    results: Receiver<Computed>,
    shared: Arc<Shared>,
}

#[derive(Debug, Default)]
struct Shared {
    /// Whole percent that are done.
    percent: AtomicU32,
    is_cancelled: AtomicBool,
}

impl HistoryJob {
    /// Jobs that take lives of red dwarfs from a store, and keep them there.
    #[must_use]
    pub(crate) fn new(store: LifeStore) -> Self {
        Self { store, running: None }
    }

    /// Starts computing. What was being computed is stopped: its thread ends at its next step.
    ///
    /// Where the exact history takes seconds, a quick look comes first.
    pub(crate) fn start(&mut self, request: Request, context: &egui::Context) {
        self.cancel();
        let (sender, results) = channel();
        let shared = Arc::new(Shared::default());
        let (context, its, store) = (context.clone(), Arc::clone(&shared), self.store.clone());
        let spawned = thread::Builder::new().name("history".to_owned()).spawn(move || {
            let is_known = request.earlier.life_of(&request.system).is_some();
            if let Some(look) = History::quick_look(request.system.clone()).filter(|_| !is_known) {
                let _ = sender.send(Ok(request.fresh(look)));
                context.request_repaint();
            }
            let tell = &mut |share| its.tell(share);
            let computed = store.history(Some(&request.earlier), request.system.clone(), tell);
            let computed = computed.map(|history| request.fresh(history));
            let ready = computed.as_ref().ok().map(|fresh| Arc::clone(&fresh.history));
            // The window may have asked for something newer and stopped listening: nothing is lost then.
            let is_wanted = sender.send(computed).is_ok();
            context.request_repaint();
            if let Some(history) = ready.filter(|_| is_wanted) {
                history.prepare_climates();
            }
        });
        self.running = spawned.ok().map(|_| Running { results, shared });
    }

    /// Whether something is being computed.
    #[must_use]
    pub(crate) fn is_running(&self) -> bool {
        self.running.is_some()
    }

    /// Whole percent of the running computation that are done.
    #[must_use]
    pub(crate) fn percent(&self) -> Option<u32> {
        self.running.as_ref().map(|running| running.shared.percent.load(Ordering::Relaxed))
    }

    /// Stops what is being computed.
    pub(crate) fn cancel(&mut self) {
        if let Some(running) = self.running.take() {
            running.shared.is_cancelled.store(true, Ordering::Relaxed);
        }
    }

    /// The result, once it is there; a quick look before it.
    pub(crate) fn poll(&mut self) -> Option<Computed> {
        let found = self.running.as_ref()?.results.recv_timeout(SHORT_WAIT);
        match found {
            Ok(computed) => {
                if !computed.as_ref().is_ok_and(|fresh| fresh.history.life().is_quick_look()) {
                    self.running = None;
                }
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

impl Drop for HistoryJob {
    fn drop(&mut self) {
        self.cancel();
    }
}

impl Shared {
    /// Takes the share that is done, and says whether to go on.
    fn tell(&self, share: f64) -> ControlFlow<()> {
        let whole = (0..=100).take_while(|percent| f64::from(*percent) <= 100.0 * share).last().unwrap_or(0);
        self.percent.store(whole, Ordering::Relaxed);
        if self.is_cancelled.load(Ordering::Relaxed) { ControlFlow::Break(()) } else { ControlFlow::Continue(()) }
    }
}

/// What is being handed over in the background, each on a thread of its own.
#[derive(Debug, Default)]
pub(crate) struct ExportJobs {
    waiting: Vec<Receiver<Exported>>,
}

impl ExportJobs {
    /// Starts work; what came of it is there at a later [`ExportJobs::poll`].
    pub(crate) fn start(&mut self, work: Work, context: &egui::Context) {
        let (sender, receiver) = channel();
        let context = context.clone();
        let spawned = thread::Builder::new().name("export".to_owned()).spawn(move || {
            // The window may have closed: then nobody asks any more.
            let _ = sender.send(work());
            context.request_repaint();
        });
        if spawned.is_ok() {
            self.waiting.push(receiver);
        }
    }

    /// Whether something is still being handed over.
    pub(crate) fn is_running(&self) -> bool {
        !self.waiting.is_empty()
    }

    /// Everything that is done.
    pub(crate) fn poll(&mut self) -> Vec<Exported> {
        let mut done = Vec::new();
        self.waiting.retain(|receiver| match receiver.try_recv() {
            Ok(exported) => {
                done.push(exported);
                false
            }
            Err(TryRecvError::Empty) => true,
            Err(TryRecvError::Disconnected) => {
                done.push(Exported::Refused("The export stopped before it was done; please report it".to_owned()));
                false
            }
        });
        done
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::StarSpecification;
    use crate::window::view::WHOLE;
    use std::time::Instant;

    fn system(mass_msun: f64) -> System {
        System { star: StarSpecification { mass_msun, ..StarSpecification::default() }, planets: Vec::new() }
    }

    fn request(system: System, earlier: &Arc<History>) -> Request {
        let earlier = Arc::clone(earlier);
        Request { system, earlier, scale: TimeScale::Paced, view: WHOLE, curves: vec![Curve::Luminosity] }
    }

    #[test]
    fn a_newer_request_stops_the_older_one() {
        let mut job = HistoryJob::default();
        let context = egui::Context::default();
        let shown = Arc::new(History::compute(system(1.0)).expect("computed"));
        let mut threads = Vec::new();
        for step in 0..20 {
            job.start(request(system(0.10 + 0.001 * f64::from(step)), &shown), &context);
            threads.push(job.running.as_ref().map(|running| Arc::downgrade(&running.shared)));
        }
        job.cancel();
        assert!(!job.is_running() && job.percent().is_none());
        // Each thread holds its share of the state until it ends; alone a life takes longer than this by far.
        let begun = Instant::now();
        while threads.iter().flatten().any(|shared| shared.strong_count() > 0) {
            assert!(begun.elapsed() < Duration::from_mins(1), "threads pile up");
            thread::sleep(Duration::from_millis(5));
        }
    }

    #[test]
    fn progress_is_told_in_whole_percent() {
        let shared = Shared::default();
        for (share, percent) in [(0.0, 0), (0.429, 42), (1.0, 100), (2.0, 100), (f64::NAN, 0)] {
            assert!(shared.tell(share).is_continue());
            assert_eq!(shared.percent.load(Ordering::Relaxed), percent);
        }
        shared.is_cancelled.store(true, Ordering::Relaxed);
        assert!(shared.tell(0.5).is_break());
    }
}
