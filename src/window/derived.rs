//! What is drawn for a history and a view, made once and kept until one of them changes.

use super::view::{View, WHOLE};
use crate::figure::curves::Curve;
use crate::figure::light_and_thresholds;
use crate::figure::ribbon::LightRange;
use crate::figure::{Chart, HrDiagram, Owner, Ribbon, Samples, Series};
use crate::system::{History, TimeAxis, TimeScale};
use std::cell::OnceCell;
use std::sync::Arc;

/// Places at which a view is read: more than the pixels of a usual screen would not be seen.
const SAMPLES: usize = 700;
/// Places at which the whole life is read for the range of light.
const COARSE_SAMPLES: usize = 240;

/// Axis, samples, charts and ribbon.
#[derive(Debug)]
pub(super) struct Derived {
    /// The time axis of the whole life.
    pub axis: TimeAxis,
    /// The history read across the view.
    pub samples: Samples,
    /// The charts on the curves page, in order.
    pub charts: Vec<Chart>,
    /// Of each chart, the pinned star's curve; empty without a pinned system.
    pub references: Vec<Vec<Series>>,
    /// The ribbon of the view.
    pub ribbon: Ribbon,
    history: Arc<History>,
    view: View,
    curves: Vec<Curve>,
    light: LightRange,
    hr_diagram: OnceCell<HrDiagram>,
    pinned: Option<Arc<History>>,
    pinned_path: OnceCell<Vec<Vec<[f64; 2]>>>,
    /// The chart of the planet whose climate is looked at.
    climate: Option<(usize, Chart)>,
}

impl Derived {
    /// Everything for a history and a view.
    pub(super) fn new(history: &Arc<History>, scale: TimeScale, view: View, curves: &[Curve]) -> Self {
        let axis = TimeAxis::new(history, scale);
        let light = LightRange::of(&Samples::new(history, &axis, WHOLE.from, WHOLE.to, COARSE_SAMPLES));
        let samples = Samples::new(history, &axis, view.from, view.to, SAMPLES);
        Self {
            charts: curves.iter().map(|curve| curve.chart(&samples)).collect(),
            ribbon: Ribbon::new(&samples, light),
            axis,
            samples,
            history: Arc::clone(history),
            view,
            curves: curves.to_vec(),
            light,
            hr_diagram: OnceCell::new(),
            climate: None,
            references: Vec::new(),
            pinned: None,
            pinned_path: OnceCell::new(),
        }
    }

    /// The Hertzsprung-Russell diagram of the whole life, made when it is first asked for.
    pub(super) fn hr_diagram(&self) -> &HrDiagram {
        self.hr_diagram.get_or_init(|| HrDiagram::new(&self.history))
    }

    /// The pinned star's way on the diagram; empty without a pinned system.
    pub(super) fn pinned_path(&self) -> &[Vec<[f64; 2]>] {
        self.pinned_path
            .get_or_init(|| self.pinned.as_deref().map_or_else(Vec::new, |pinned| self.hr_diagram().path(pinned)))
    }

    /// The starlight of a planet against the thresholds of its climate, made when it is first looked at.
    pub(super) fn climate_chart(&mut self, index: usize) -> &Chart {
        let known = self.climate.take().filter(|(of, _)| *of == index);
        let chart = known.unwrap_or_else(|| (index, light_and_thresholds::chart(&self.history, &self.samples, index)));
        &self.climate.insert(chart).1
    }

    /// Makes anew only what changed.
    pub(super) fn update(
        &mut self,
        history: &Arc<History>,
        scale: TimeScale,
        view: View,
        curves: &[Curve],
        pinned: Option<&Arc<History>>,
    ) {
        let same = |first: Option<&Arc<History>>, second: Option<&Arc<History>>| match (first, second) {
            (Some(first), Some(second)) => Arc::ptr_eq(first, second),
            (None, None) => true,
            _ => false,
        };
        let is_new = !Arc::ptr_eq(history, &self.history) || scale != self.axis.scale();
        let wants_references =
            is_new || view != self.view || *curves != self.curves[..] || !same(pinned, self.pinned.as_ref());
        if is_new {
            *self = Self::new(history, scale, view, curves);
        } else {
            self.update_charts(history, view, curves);
        }
        if wants_references {
            self.pinned = pinned.cloned();
            self.pinned_path = OnceCell::new();
            self.references = self.pinned.as_deref().map_or_else(Vec::new, |pinned| self.references_of(pinned));
        }
    }

    /// The star's curves of another history at the same ages.
    fn references_of(&self, pinned: &History) -> Vec<Vec<Series>> {
        let samples = Samples::new(pinned, &self.axis, self.view.from, self.view.to, SAMPLES);
        let of_star = |curve: &Curve| {
            let mut series = curve.chart(&samples).series;
            series.retain(|series| series.owner == Owner::Star);
            series
        };
        self.curves.iter().map(of_star).collect()
    }

    fn update_charts(&mut self, history: &Arc<History>, view: View, curves: &[Curve]) {
        let view_changed = view != self.view;
        if view_changed {
            self.samples = Samples::new(history, &self.axis, view.from, view.to, SAMPLES);
            self.ribbon = Ribbon::new(&self.samples, self.light);
            self.view = view;
            self.climate = None;
        }
        if view_changed || *curves != self.curves[..] {
            self.charts = curves.iter().map(|curve| curve.chart(&self.samples)).collect();
            self.curves = curves.to_vec();
        }
    }
}
