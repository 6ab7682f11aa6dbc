//! Drives the window as a person would: finds things by name, clicks, drags, types, waits for what is computed.

use egui::accesskit::Role;
use egui::epaint::ColorMode;
use egui::{Color32, Event, Key, Modifiers, MouseWheelUnit, Pos2, Rect, Shape, Vec2, pos2, vec2};
use egui_kittest::kittest::{AccessKitNode, NodeT};
use egui_kittest::{Harness, Node};
use longember::document::{Scenario, built_in};
use longember::units::number_text::number;
use longember::units::time_words::parse_span;
use longember::window::{Command, Longember, Workspace};
use std::fmt::Write;
use std::iter::successors;

/// Ctrl, as this system sends it with a key.
pub(crate) const CTRL: Modifiers = Modifiers { alt: false, ctrl: true, shift: false, mac_cmd: false, command: true };
/// Ctrl and Shift together.
pub(crate) const CTRL_SHIFT: Modifiers = Modifiers { shift: true, ..CTRL };
/// The usual size of the window, points.
pub(crate) const USUAL: Vec2 = vec2(1280.0, 800.0);
/// Name of the strip for assistive technology.
pub(crate) const STRIP: &str = "Moment on the life strip, years";

/// Name of the charts for assistive technology.
pub(crate) const CHARTS: &str = "Moment on the curves, years";

/// Time between two frames, seconds: short enough that two clicks make a double click.
const FRAME_S: f32 = 0.05;
/// Most frames that a computation in the background may take; each waits a few milliseconds for it.
const MOST_FRAMES: usize = 20_000;

/// A window without a display.
pub(crate) struct Driver {
    pub(crate) harness: Harness<'static, Longember>,
}

impl Driver {
    /// The window as it opens when nothing is named.
    pub(crate) fn demo() -> Self {
        Self::of(built_in::demo().scenario().expect("the demo is sound"))
    }

    /// The window on a scenario.
    pub(crate) fn of(scenario: Scenario) -> Self {
        Self::sized(scenario, USUAL, 1.0)
    }

    /// The window on a scenario, with a size in points and a scale.
    pub(crate) fn sized(scenario: Scenario, size: Vec2, pixels_per_point: f32) -> Self {
        let harness = Harness::builder()
            .with_size(size)
            .with_pixels_per_point(pixels_per_point)
            .with_step_dt(FRAME_S)
            .build_eframe(|creation| {
                Longember::for_tests(&creation.egui_ctx, scenario).expect("the star has a history")
            });
        let mut driver = Self { harness };
        driver.settle();
        driver
    }

    /// What the window works on.
    pub(crate) fn workspace(&self) -> &Workspace {
        &self.harness.state().workspace
    }

    /// Tells the window a command, as a menu would.
    pub(crate) fn tell(&mut self, command: Command) {
        let context = self.harness.ctx.clone();
        self.harness.state_mut().perform(&context, command);
        self.harness.run_steps(2);
    }

    /// Draws frames until nothing is being computed and what was asked for is seen.
    pub(crate) fn settle(&mut self) {
        self.harness.run_steps(3);
        let mut frames = 0;
        while self.workspace().is_stale() && self.workspace().trouble.is_none() {
            assert!(frames < MOST_FRAMES, "still computing after {frames} frames");
            self.harness.step();
            frames += 1;
        }
        self.harness.run_steps(3);
        self.harness.check_accessibility();
    }

    /// The one thing to use that has this name; fails with everything there is when it is missing or not alone.
    pub(crate) fn the(&self, name: &str) -> Node<'_> {
        let mut found: Vec<Node<'_>> = self.named(|label| label == name);
        found.retain(|node| is_used(node.accesskit_node().role()));
        assert_eq!(found.len(), 1, "{} things are named {name:?}:\n{}", found.len(), self.everything());
        found[0]
    }

    /// Whether there is something to use that has this name.
    pub(crate) fn has(&self, name: &str) -> bool {
        self.named(|label| label == name).iter().any(|node| is_used(node.accesskit_node().role()))
    }

    /// The name of the one thing to use whose name starts like this.
    pub(crate) fn name_of(&self, start: &str) -> String {
        let found: Vec<String> = self.names().into_iter().filter(|name| name.starts_with(start)).collect();
        assert_eq!(found.len(), 1, "{found:?} start with {start:?}:\n{}", self.everything());
        found[0].clone()
    }

    /// The name of the first thing to use whose name holds this.
    pub(crate) fn name_of_first(&self, part: &str) -> String {
        let found = self.names().into_iter().find(|name| name.contains(part));
        found.unwrap_or_else(|| unreachable!("nothing holds {part:?}:\n{}", self.everything()))
    }

    /// Names of everything to use.
    pub(crate) fn names(&self) -> Vec<String> {
        let nodes = self.harness.root().children_recursive().map(|node| node.accesskit_node());
        nodes.filter(|node| is_used(node.role())).map(|node| label(&node)).collect()
    }

    /// Whether something shown holds this text.
    pub(crate) fn shows(&self, text: &str) -> bool {
        !self.named(|label| label.contains(text)).is_empty()
    }

    fn named(&self, is_meant: impl Fn(&str) -> bool) -> Vec<Node<'_>> {
        self.harness.root().children_recursive().filter(|node| is_meant(&label(&node.accesskit_node()))).collect()
    }

    /// The number that a slider tells.
    pub(crate) fn number(&self, name: &str) -> f64 {
        self.the(name).accesskit_node().numeric_value().expect("a number")
    }

    /// The text in a field.
    pub(crate) fn text_in(&self, name: &str) -> String {
        self.the(name).value().expect("a text")
    }

    /// Scrolls until the one thing that has this name is in view, if it stands in something that scrolls.
    pub(crate) fn reach(&mut self, name: &str) {
        let node = self.the(name);
        let strip = self.the(STRIP);
        let pane = |node: &Node<'_>| {
            let ancestors = successors(node.parent(), NodeT::parent);
            ancestors.map(|node| node.accesskit_node()).find(|node| node.role() == Role::Pane).map(|pane| pane.id())
        };
        let is_in_view = node.rect().bottom() <= strip.rect().top() && node.rect().top() >= 0.0;
        if is_in_view || pane(&node) == pane(&strip) {
            return;
        }
        node.scroll_to_me();
        // The toolkit scrolls over some frames.
        self.harness.run_steps(40);
    }

    /// Clicks the one thing that has this name.
    pub(crate) fn click(&mut self, name: &str) {
        self.reach(name);
        self.the(name).click();
        self.settle();
    }

    /// Clicks a place.
    pub(crate) fn click_at(&mut self, place: Pos2) {
        self.harness.hover_at(place);
        self.harness.drag_at(place);
        self.harness.drop_at(place);
        self.settle();
    }

    /// Chooses from a menu of the bar.
    pub(crate) fn choose(&mut self, menu: &str, item: &str) {
        self.click(menu);
        self.click(&self.name_of(item));
    }

    /// Presses a key.
    pub(crate) fn press(&mut self, modifiers: Modifiers, key: Key) {
        self.harness.key_press_modifiers(modifiers, key);
        self.settle();
    }

    /// Presses the pointer at one place, moves it through others, lets go.
    pub(crate) fn drag(&mut self, from: Pos2, through: &[Pos2]) {
        self.harness.hover_at(from);
        self.harness.drag_at(from);
        for place in through {
            self.harness.hover_at(*place);
        }
        self.harness.drop_at(*through.last().unwrap_or(&from));
        self.settle();
    }

    /// Turns the wheel at a place, positive to zoom in.
    pub(crate) fn wheel(&mut self, place: Pos2, points: f32) {
        self.harness.hover_at(place);
        self.harness.event(Event::MouseWheel {
            unit: MouseWheelUnit::Point,
            delta: vec2(0.0, points),
            phase: egui::TouchPhase::Move,
            source: egui::MouseWheelSource::Wheel,
            modifiers: Modifiers::NONE,
        });
        // The toolkit spreads one turn over some frames.
        self.harness.run_steps(30);
        self.settle();
    }

    /// Types over what is in a field, without leaving it.
    pub(crate) fn type_over(&mut self, name: &str, text: &str) {
        self.reach(name);
        self.the(name).click();
        self.harness.run_steps(3);
        self.harness.key_press_modifiers(CTRL, Key::A);
        if text.is_empty() {
            self.harness.key_press(Key::Backspace);
        } else {
            self.harness.event(Event::Text(text.to_owned()));
        }
        self.harness.run_steps(3);
    }

    /// Types over what is in a field and enters it.
    pub(crate) fn enter(&mut self, name: &str, text: &str) {
        self.type_over(name, text);
        self.press(Modifiers::NONE, Key::Enter);
    }

    /// The time that the panel of this moment is headed with, as it reads.
    pub(crate) fn panel_time_yr(&self) -> f64 {
        let nodes = self.harness.root().children_recursive().map(|node| label(&node.accesskit_node()));
        let after: Vec<String> = nodes.skip_while(|label| label != "This moment").skip(1).take(1).collect();
        parse_span(&after[0]).expect("a span of time")
    }

    /// Asserts that every view tells the same instant: the model, strip, charts, field and panel.
    pub(crate) fn assert_one_instant(&self) -> f64 {
        let moment_yr = self.workspace().moment_yr;
        assert_eq!(self.number(STRIP), moment_yr);
        assert_eq!(self.number(CHARTS), moment_yr);
        let four_digits = 1e-3 * moment_yr;
        let field_yr = parse_span(&self.text_in("Moment")).expect("a span of time");
        assert!((field_yr - moment_yr).abs() <= four_digits, "the field says {field_yr}, it is {moment_yr}");
        assert!((self.panel_time_yr() - moment_yr).abs() <= four_digits, "the panel says {}", self.panel_time_yr());
        let star = self.workspace().history.moment(moment_yr).star;
        let luminosity = star.luminosity_lsun.map_or_else(|| "not modelled".to_owned(), |value| number(value, 4));
        assert!(self.name_of("Luminosity: ").contains(&luminosity), "{luminosity}: {}", self.name_of("Luminosity: "));
        moment_yr
    }

    /// Where the Hertzsprung-Russell diagram is drawn.
    pub(crate) fn diagram(&self) -> Rect {
        let nodes = self.named(|label| label.starts_with("Hertzsprung-Russell diagram"));
        assert_eq!(nodes.len(), 1, "{}", self.everything());
        nodes[0].rect()
    }

    /// A place on the strip, as a share of its width.
    pub(crate) fn on_strip(&self, share: f32) -> Pos2 {
        let rect = self.the(STRIP).rect();
        pos2(rect.left() + share * rect.width(), rect.center().y)
    }

    /// Role and name of everything there is, one a line.
    pub(crate) fn everything(&self) -> String {
        let mut text = String::new();
        for node in self.harness.root().children_recursive() {
            let node = node.accesskit_node();
            if !label(&node).is_empty() || is_used(node.role()) {
                let value = node.value().map_or_else(String::new, |value| format!(" = {value:?}"));
                writeln!(text, "{:?} {:?}{value}", node.role(), label(&node)).expect("memory");
            }
        }
        text
    }

    /// Colours of the outlines drawn closely around something.
    pub(crate) fn outlines(&self, name: &str) -> Vec<Color32> {
        let rect = self.the(name).rect();
        let mut colours = Vec::new();
        for clipped in &self.harness.output().shapes {
            each_shape(&clipped.shape, &mut |shape| {
                if let Shape::Rect(outline) = shape
                    && outline.stroke.width > 0.0
                    && outline.rect.contains_rect(rect.shrink(1.0))
                    && rect.expand(4.0).contains_rect(outline.rect)
                {
                    colours.push(outline.stroke.color);
                }
            });
        }
        colours
    }

    /// How many curves are drawn that nothing shows through.
    pub(crate) fn opaque_lines(&self) -> usize {
        let mut count = 0;
        for clipped in &self.harness.output().shapes {
            each_shape(&clipped.shape, &mut |shape| {
                if let Shape::Path(path) = shape
                    && let ColorMode::Solid(colour) = path.stroke.color
                    && path.points.len() > 100
                    && colour.is_opaque()
                {
                    count += 1;
                }
            });
        }
        count
    }

    /// Every text that is drawn, with its place and the frame beyond which it is cut.
    pub(crate) fn drawn_texts(&self) -> Vec<(String, Rect, Rect)> {
        let mut texts = Vec::new();
        for clipped in &self.harness.output().shapes {
            each_shape(&clipped.shape, &mut |shape| {
                if let Shape::Text(text) = shape {
                    texts.push((text.galley.text().to_owned(), text.visual_bounding_rect(), clipped.clip_rect));
                }
            });
        }
        texts
    }
}

/// Calls for a shape and everything in it.
fn each_shape(shape: &Shape, call: &mut impl FnMut(&Shape)) {
    call(shape);
    if let Shape::Vec(shapes) = shape {
        for shape in shapes {
            each_shape(shape, call);
        }
    }
}

/// The name of a node, or the text that it is.
pub(crate) fn label(node: &AccessKitNode<'_>) -> String {
    let own = node.label().filter(|label| !label.is_empty());
    own.or_else(|| if node.role() == Role::Label { node.value() } else { None }).unwrap_or_default()
}

/// Whether things of a role are there to be used.
pub(crate) fn is_used(role: Role) -> bool {
    !matches!(role, Role::Label | Role::GenericContainer | Role::Unknown | Role::Window | Role::TextRun | Role::Image)
}
