//! The star beside the pinned one: how many times as bright, large, hot, heavy.

use crate::system::Moment;
use crate::system::quantities::STAR;
use crate::units::number_text::number;
use crate::window::theme::{ROW, usual};
use crate::window::widgets::heading::section;
use crate::window::workspace::Workspace;
use egui::{Align2, Role, Sense, Ui, WidgetInfo, pos2, vec2};

/// Figures whose ratio says something.
const COMPARED: [&str; 4] = ["luminosity_lsun", "radius_rsun", "effective_temperature_k", "mass_msun"];

/// Draws the ratios at the same age.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, moment: &Moment) {
    let Some(pinned) = &workspace.pinned else { return };
    let palette = workspace.palette();
    section(ui, palette, &format!("Against {} at the same age", pinned.label));
    let (other, _) = pinned.history.figures_at(moment.time_yr);
    for quantity in STAR.iter().filter(|quantity| COMPARED.contains(&quantity.key)) {
        let ratio = match ((quantity.value)(&moment.star), (quantity.value)(&other)) {
            (Some(here), Some(there)) if there > 0.0 => format!("× {}", number(here / there, 3)),
            _ => "not modelled".to_owned(),
        };
        let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::hover());
        response.widget_info(|| WidgetInfo::labeled(Role::Label, true, format!("{} {ratio}", quantity.name)));
        let y = rect.center().y;
        ui.painter().text(pos2(rect.left(), y), Align2::LEFT_CENTER, quantity.name, usual(), palette.dim);
        ui.painter().text(pos2(rect.right(), y), Align2::RIGHT_CENTER, ratio, usual(), palette.text);
    }
}
