//! The window of the system without OpenGL: events in, frames out, nothing between them.

use super::canvas::Canvas;
use crate::window::{Longember, NoWindow};
use egui::{Context, ViewportBuilder, ViewportCommand, ViewportEvent, ViewportId, ViewportInfo};
use egui_winit::accesskit_winit::{Event as AccessEvent, WindowEvent as AccessWindowEvent};
use egui_winit::{ActionRequested, State};
use softbuffer::Surface;
use std::num::NonZeroU32;
use std::rc::Rc;
use std::sync::Arc;
use std::time::Instant;
use winit::application::ApplicationHandler;
use winit::event::WindowEvent;
use winit::event_loop::{ActiveEventLoop, ControlFlow, EventLoop, EventLoopProxy, OwnedDisplayHandle};
use winit::window::{Window, WindowId};

/// Largest side of a texture: memory is the only limit here.
const LARGEST_TEXTURE: usize = 8192;

/// Makes the program once there is a window.
type Make = Box<dyn FnOnce(&Context) -> Result<Longember, String>>;

/// What reaches the loop from outside.
enum Message {
    /// Draw again at this time.
    RepaintAt(Instant),
    /// Assistive technology.
    Access(AccessEvent),
}

impl From<AccessEvent> for Message {
    fn from(event: AccessEvent) -> Self {
        Self::Access(event)
    }
}

/// The open window.
struct Shown {
    window: Rc<Window>,
    surface: Surface<OwnedDisplayHandle, Rc<Window>>,
    state: State,
    info: ViewportInfo,
    program: Longember,
    canvas: Canvas,
}

struct Runner {
    context: Context,
    viewport: ViewportBuilder,
    make: Option<Make>,
    shown: Option<Shown>,
    next: Option<Instant>,
    proxy: EventLoopProxy<Message>,
    trouble: Option<String>,
}

/// Opens the window and returns when it closes.
///
/// # Errors
/// [`NoWindow`] with what the system says.
pub(in crate::window) fn run(viewport: ViewportBuilder, make: Make) -> Result<(), NoWindow> {
    let event_loop = EventLoop::<Message>::with_user_event().build().map_err(|_| NoWindow::no_display())?;
    let context = Context::default();
    let proxy = event_loop.create_proxy();
    let sender = proxy.clone();
    context.set_request_repaint_callback(move |request| {
        // When the loop is gone there is nothing left to draw.
        let _ = sender.send_event(Message::RepaintAt(Instant::now() + request.delay));
    });
    let mut runner = Runner { context, viewport, make: Some(make), shown: None, next: None, proxy, trouble: None };
    let failed = |reason: String| NoWindow::NoDisplay { reason };
    event_loop.run_app(&mut runner).map_err(|error| failed(error.to_string()))?;
    if let Some(shown) = &mut runner.shown {
        shown.program.leave();
    }
    runner.trouble.map_or(Ok(()), |reason| Err(failed(reason)))
}

impl Runner {
    fn open(&mut self, event_loop: &ActiveEventLoop) -> Result<(), String> {
        let Some(make) = self.make.take() else { return Ok(()) };
        // Assistive technology must be ready before the window is seen.
        let hidden = self.viewport.clone().with_visible(false);
        let window =
            egui_winit::create_window(&self.context, event_loop, &hidden).map_err(|error| error.to_string())?;
        let window = Rc::new(window);
        let display = softbuffer::Context::new(event_loop.owned_display_handle()).map_err(|error| error.to_string())?;
        let surface = Surface::new(&display, Rc::clone(&window)).map_err(|error| error.to_string())?;
        let scale = Some(window.scale_factor() as f32);
        let (context, theme) = (self.context.clone(), window.theme());
        let mut state = State::new(context, ViewportId::ROOT, &*window, scale, theme, Some(LARGEST_TEXTURE));
        state.init_accesskit(event_loop, &window, self.proxy.clone());
        window.set_visible(true);
        let program = make(&self.context)?;
        let mut info = ViewportInfo::default();
        egui_winit::update_viewport_info(&mut info, &self.context, &window, true);
        self.shown = Some(Shown { window, surface, state, info, program, canvas: Canvas::default() });
        Ok(())
    }

    /// Draws a frame and carries out what it asks of the window.
    fn draw(&mut self, event_loop: &ActiveEventLoop) -> Result<(), String> {
        let Some(shown) = &mut self.shown else { return Ok(()) };
        let size = shown.window.inner_size();
        let (Some(width), Some(height)) = (NonZeroU32::new(size.width), NonZeroU32::new(size.height)) else {
            return Ok(());
        };
        self.next = None;
        egui_winit::update_viewport_info(&mut shown.info, &self.context, &shown.window, false);
        let mut input = shown.state.take_egui_input(&shown.window);
        let is_asked_to_close = shown.info.events.contains(&ViewportEvent::Close);
        input.viewports.insert(ViewportId::ROOT, std::mem::take(&mut shown.info));
        let program = &mut shown.program;
        let mut output = self.context.run_ui(input, |ui| program.root_ui(ui));
        shown.state.handle_platform_output_with_event_loop(&shown.window, event_loop, output.platform_output);
        let primitives = self.context.tessellate(output.shapes, output.pixels_per_point);
        let (pixels, ground) = ([size.width as usize, size.height as usize], program.workspace.palette().ground);
        shown.canvas.paint(pixels, output.pixels_per_point, ground, &primitives, &mut output.textures_delta);
        shown.surface.resize(width, height).map_err(|error| error.to_string())?;
        let mut buffer = shown.surface.buffer_mut().map_err(|error| error.to_string())?;
        buffer.copy_from_slice(shown.canvas.pixels());
        shown.window.pre_present_notify();
        buffer.present().map_err(|error| error.to_string())?;
        let Some(asked) = output.viewport_output.remove(&ViewportId::ROOT) else { return Ok(()) };
        let stays = asked.commands.contains(&ViewportCommand::CancelClose);
        let closes = asked.commands.contains(&ViewportCommand::Close);
        let mut actions = Vec::new();
        egui_winit::process_viewport_commands(
            &self.context,
            &mut shown.info,
            asked.commands,
            &shown.window,
            &mut actions,
        );
        for action in actions {
            if let ActionRequested::Screenshot(answer) = action {
                let image = egui::ColorImage::from_rgb(shown.canvas.size(), &shown.canvas.rgb());
                answer.complete(Arc::new(image));
            }
        }
        if (is_asked_to_close && !stays) || closes {
            event_loop.exit();
        } else if asked.repaint_delay.is_zero() {
            shown.window.request_redraw();
        } else if let Some(at) = Instant::now().checked_add(asked.repaint_delay) {
            self.draw_at(at);
        }
        Ok(())
    }

    fn draw_at(&mut self, at: Instant) {
        self.next = Some(self.next.map_or(at, |next| next.min(at)));
    }

    /// Ends the loop when something went wrong for good.
    fn check(&mut self, event_loop: &ActiveEventLoop, result: Result<(), String>) {
        if let Err(trouble) = result {
            self.trouble = Some(trouble);
            event_loop.exit();
        }
    }
}

impl ApplicationHandler<Message> for Runner {
    fn resumed(&mut self, event_loop: &ActiveEventLoop) {
        let opened = self.open(event_loop);
        self.check(event_loop, opened);
    }

    fn user_event(&mut self, _event_loop: &ActiveEventLoop, message: Message) {
        match message {
            Message::RepaintAt(at) => self.draw_at(at),
            Message::Access(event) => {
                let Some(shown) = &mut self.shown else { return };
                match event.window_event {
                    AccessWindowEvent::InitialTreeRequested => self.context.enable_accesskit(),
                    AccessWindowEvent::ActionRequested(request) => {
                        shown.state.on_accesskit_action_request(request);
                    }
                    AccessWindowEvent::AccessibilityDeactivated => self.context.disable_accesskit(),
                }
                shown.window.request_redraw();
            }
        }
    }

    fn window_event(&mut self, event_loop: &ActiveEventLoop, _window: WindowId, event: WindowEvent) {
        match event {
            WindowEvent::RedrawRequested => {
                let drawn = self.draw(event_loop);
                self.check(event_loop, drawn);
            }
            WindowEvent::CloseRequested => {
                if let Some(shown) = &mut self.shown {
                    shown.info.events.push(ViewportEvent::Close);
                    shown.window.request_redraw();
                }
            }
            other => {
                if let Some(shown) = &mut self.shown
                    && shown.state.on_window_event(&shown.window, &other).repaint
                {
                    shown.window.request_redraw();
                }
            }
        }
    }

    fn about_to_wait(&mut self, event_loop: &ActiveEventLoop) {
        if let (Some(next), Some(shown)) = (self.next, &self.shown)
            && next <= Instant::now()
        {
            self.next = None;
            shown.window.request_redraw();
        }
        event_loop.set_control_flow(self.next.map_or(ControlFlow::Wait, ControlFlow::WaitUntil));
    }
}
