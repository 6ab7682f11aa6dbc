//! Colours and sizes of the window. One accent; the star's own colour is data and never decoration.

use crate::document::Theme;
use egui::{Color32, CornerRadius, FontFamily, FontId, Margin, Stroke, TextStyle, Vec2};

/// The colours of a theme.
#[must_use]
pub(crate) fn palette(theme: Theme) -> &'static Palette {
    match theme {
        Theme::Dark => &DARK,
        Theme::Light => &LIGHT,
        Theme::Dome => &DOME,
    }
}

/// Every colour that may be used.
#[derive(Debug, PartialEq)]
pub struct Palette {
    /// Ground of the stage.
    pub ground: Color32,
    /// Ground of panels and strip.
    pub panel: Color32,
    /// Ground of fields and buttons.
    pub field: Color32,
    /// Ground of a chosen or hovered row.
    pub chosen: Color32,
    /// Thin separators and grid lines.
    pub hairline: Color32,
    /// Text.
    pub text: Color32,
    /// Secondary text.
    pub dim: Color32,
    /// The one accent: moment, focus, links.
    pub accent: Color32,
    /// Errors, always with words.
    pub error: Color32,
    /// Neutral mid grey on which true colours stand.
    pub bed: Color32,
    /// Neutral casing of true-colour lines.
    pub casing: Color32,
    /// Text on the bed.
    pub on_bed: Color32,
    /// Planet curves, told apart by colour-blind readers too, each with a dash pattern of its own.
    pub planets: [Color32; 7],
    /// Band of liquid water.
    pub water: Color32,
    /// Band of the habitable zone.
    pub zone: Color32,
    /// The body of the star.
    pub star_body: Color32,
    /// Spread of a curve.
    pub spread: Color32,
    /// Whether dark visuals are the base.
    pub is_dark: bool,
}

const fn rgb(hex: u32) -> Color32 {
    Color32::from_rgb((hex >> 16 & 255) as u8, (hex >> 8 & 255) as u8, (hex & 255) as u8)
}

/// Colours after Okabe & Ito 2008, lightened for a dark ground.
static DARK: Palette = Palette {
    ground: rgb(0x101113),
    panel: rgb(0x16181B),
    field: rgb(0x202328),
    chosen: rgb(0x25292F),
    hairline: rgb(0x31353B),
    text: rgb(0xE4E3DF),
    dim: rgb(0xA0A4AA),
    accent: rgb(0x4FD1B8),
    error: rgb(0xFF8A75),
    bed: rgb(0x62656A),
    casing: rgb(0x4A4D52),
    on_bed: rgb(0xFFFFFF),
    planets: [rgb(0xE69F00), rgb(0x56B4E9), rgb(0xE68FBF), rgb(0xF0E442), rgb(0x3DBE93), rgb(0xF07F4A), rgb(0xA9B4FF)],
    water: rgb(0x17262D),
    zone: rgb(0x1B3A30),
    star_body: rgb(0x3A3C41),
    spread: rgb(0x2B2E33),
    is_dark: true,
};

static LIGHT: Palette = Palette {
    ground: rgb(0xFBFAF8),
    panel: rgb(0xF3F2EF),
    field: rgb(0xFFFFFF),
    chosen: rgb(0xE4E8E6),
    hairline: rgb(0xCFCDC8),
    text: rgb(0x1C1D1F),
    dim: rgb(0x5A5D61),
    accent: rgb(0x00735F),
    error: rgb(0xB3261E),
    bed: rgb(0x8A8C90),
    casing: rgb(0x6F7175),
    on_bed: rgb(0x101113),
    planets: [rgb(0xA86A00), rgb(0x0072B2), rgb(0xA8477F), rgb(0x7A7000), rgb(0x00704F), rgb(0xB84800), rgb(0x5A50B0)],
    water: rgb(0xDDEBF1),
    zone: rgb(0xCFE8DA),
    star_body: rgb(0xD5D3CE),
    spread: rgb(0xE6E4DF),
    is_dark: false,
};

static DOME: Palette = Palette {
    ground: rgb(0x000000),
    panel: rgb(0x050300),
    field: rgb(0x140B00),
    chosen: rgb(0x1E1100),
    hairline: rgb(0x2C1A04),
    text: rgb(0xC4873C),
    dim: rgb(0xAE7936),
    accent: rgb(0xE0A050),
    error: rgb(0xE06A3C),
    bed: rgb(0x2A2A2A),
    casing: rgb(0x2E2419),
    on_bed: rgb(0xC4A377),
    planets: [rgb(0xB87A30), rgb(0x9C7A50), rgb(0xA86A4A), rgb(0xB89A40), rgb(0x8C7A4A), rgb(0xB06030), rgb(0x9A8060)],
    water: rgb(0x120B04),
    zone: rgb(0x1A1206),
    star_body: rgb(0x1E1610),
    spread: rgb(0x181008),
    is_dark: true,
};

/// The grid everything stands on, points.
pub(crate) const GRID: f32 = 4.0;
/// Height of one row of figures, points.
pub(crate) const ROW: f32 = 22.0;
/// Usual text, points.
pub(crate) const TEXT_SIZE: f32 = 13.0;
/// Small text: units, ticks, headings, points.
pub(crate) const SMALL_SIZE: f32 = 11.0;
/// The moment in the answer panel, points.
pub(crate) const LARGE_SIZE: f32 = 19.0;

/// Small text.
#[must_use]
pub(crate) fn small() -> FontId {
    FontId::proportional(SMALL_SIZE)
}

/// Usual text.
#[must_use]
pub(crate) fn usual() -> FontId {
    FontId::proportional(TEXT_SIZE)
}

/// Puts colours, sizes and spacing into the window toolkit.
pub(crate) fn apply(context: &egui::Context, theme: Theme) {
    let palette = palette(theme);
    context.set_theme(if palette.is_dark { egui::Theme::Dark } else { egui::Theme::Light });
    context.all_styles_mut(|style| {
        style.text_styles = [
            (TextStyle::Small, small()),
            (TextStyle::Body, usual()),
            (TextStyle::Button, usual()),
            (TextStyle::Monospace, usual()),
            (TextStyle::Heading, FontId::new(15.0, FontFamily::Name(super::fonts::BOLD.into()))),
        ]
        .into();
        style.spacing.item_spacing = Vec2::new(2.0 * GRID, GRID);
        style.spacing.button_padding = Vec2::new(2.0 * GRID, 3.0);
        style.spacing.interact_size = Vec2::new(24.0, ROW);
        style.spacing.menu_margin = Margin::same(6);
        style.spacing.menu_width = 220.0;
        style.spacing.scroll.bar_width = 6.0;
        style.interaction.selectable_labels = false;
        style.interaction.tooltip_delay = 0.35;
        style.animation_time = 0.0;
        paint_visuals(&mut style.visuals, palette);
    });
}

fn paint_visuals(visuals: &mut egui::Visuals, palette: &Palette) {
    visuals.dark_mode = palette.is_dark;
    visuals.panel_fill = palette.panel;
    visuals.window_fill = palette.panel;
    visuals.window_stroke = Stroke::new(1.0, palette.hairline);
    visuals.window_corner_radius = CornerRadius::same(6);
    visuals.menu_corner_radius = CornerRadius::same(6);
    visuals.extreme_bg_color = palette.field;
    visuals.text_edit_bg_color = Some(palette.field);
    visuals.faint_bg_color = palette.chosen;
    visuals.code_bg_color = palette.field;
    visuals.override_text_color = None;
    visuals.weak_text_color = Some(palette.dim);
    visuals.hyperlink_color = palette.accent;
    visuals.error_fg_color = palette.error;
    visuals.warn_fg_color = palette.error;
    visuals.selection.bg_fill = palette.accent.gamma_multiply(0.35);
    visuals.selection.stroke = Stroke::new(1.0, palette.accent);
    let radius = CornerRadius::same(4);
    let ink = |color| Stroke::new(1.0, color);
    for (widget, fill, border, text) in [
        (&mut visuals.widgets.noninteractive, palette.panel, palette.hairline, palette.text),
        (&mut visuals.widgets.inactive, palette.field, palette.hairline, palette.text),
        (&mut visuals.widgets.hovered, palette.chosen, palette.dim, palette.text),
        (&mut visuals.widgets.active, palette.chosen, palette.accent, palette.text),
        (&mut visuals.widgets.open, palette.chosen, palette.dim, palette.text),
    ] {
        widget.bg_fill = fill;
        widget.weak_bg_fill = fill;
        widget.bg_stroke = ink(border);
        widget.fg_stroke = ink(text);
        widget.corner_radius = radius;
        widget.expansion = 0.0;
    }
}

/// Contrast of two colours, 1 to 21 (WCAG 2.1, relative luminance with the sRGB curve).
#[must_use]
pub fn contrast(first: Color32, second: Color32) -> f32 {
    let luminance = |color: Color32| {
        let [r, g, b] = [color.r(), color.g(), color.b()].map(egui::ecolor::linear_f32_from_gamma_u8);
        0.2126 * r + 0.7152 * g + 0.0722 * b
    };
    let (light, dark) = (luminance(first).max(luminance(second)), luminance(first).min(luminance(second)));
    (light + 0.05) / (dark + 0.05)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Least contrast of text, WCAG 2.1 success criterion 1.4.3.
    const TEXT_CONTRAST: f32 = 4.5;
    /// Least contrast of graphic objects, WCAG 2.1 success criterion 1.4.11.
    const GRAPHIC_CONTRAST: f32 = 3.0;

    #[test]
    fn every_theme_can_be_read() {
        for theme in Theme::ALL {
            let palette = palette(theme);
            for ground in [palette.ground, palette.panel, palette.field, palette.chosen] {
                for ink in [palette.text, palette.dim, palette.accent, palette.error] {
                    let found = contrast(ink, ground);
                    assert!(found >= TEXT_CONTRAST, "{theme:?}: {ink:?} on {ground:?} has {found:.2}");
                }
            }
            for planet in palette.planets {
                let found = contrast(planet, palette.ground);
                assert!(found >= GRAPHIC_CONTRAST, "{theme:?}: {planet:?} has {found:.2}");
            }
            assert!(contrast(palette.on_bed, palette.bed) >= TEXT_CONTRAST, "{theme:?}: bed");
        }
    }
}
