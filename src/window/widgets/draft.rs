//! What is typed but not entered yet, kept between frames.

use egui::Ui;
use egui::{Id, util::id_type_map::SerializableAny};

/// Keeps a draft for a field, or forgets it.
pub(crate) fn keep_draft<T: SerializableAny>(ui: &Ui, id: Id, draft: Option<T>) {
    ui.data_mut(|data| match draft {
        Some(draft) => {
            data.insert_temp(id, draft);
        }
        None => data.remove::<T>(id),
    });
}
