//! The words of the command line.

use super::destination::Destination;
use super::outcome::GraphicsChoice;
use super::scenario_source::ScenarioSource;
use crate::drawing::frames::{FrameFormat, FrameSubject, Shape};
use crate::drawing::{Look, Plot};
use crate::figure::SkyView;
use crate::system::cues::{FrameRate, Transition};
use crate::system::{EventGroup, TimeScale};
use clap::builder::{OsStringValueParser, PossibleValue, PossibleValuesParser, TypedValueParser};
use clap::{Args, Parser, Subcommand, ValueEnum};
use std::path::PathBuf;
use std::sync::LazyLock;

/// Name and, where the build knows it, commit.
static VERSION: LazyLock<String> = LazyLock::new(|| match option_env!("LONGEMBER_COMMIT") {
    Some(commit) => format!("{} ({commit})", env!("CARGO_PKG_VERSION")),
    None => env!("CARGO_PKG_VERSION").to_owned(),
});

const AFTER_HELP: &str = "\
SCENARIO is a file, demo:NAME for a built-in one, or - for standard input.
TIME counts from the star's arrival on the main sequence: 4.57Gyr, 2.1e12yr,
\"3 trillion years\", now (the scenario's present age), or an event of this
history by its name: event:\"largest radius\"

Exit codes: 0 done, 1 a statement does not hold, 2 wrong usage, 3 bad scenario or value, 4 file trouble.";

const CHECK_HELP: &str = "\
A line says body, quantity, when, relation, value with its unit:
  star luminosity at 5 Gyr is about 1.0 Lsun
  Talune surface temperature ever is at least 373 K
  Talune event 'engulfed by the star' never happens

A statement within the spread of the model does not fail; one that cannot be
judged does.

Examples:
  longember check demo:sunlike_five_worlds
  longember check --statement \"star radius ever is at least 200 Rsun\"";

const FRAMES_HELP: &str = "\
The show is that of the scenario's cues, or one sweep from --from to --to in --seconds.
Good frames that are there are kept, so that a run that was stopped goes on where it
ended; a frame appears whole or not at all, the same bit for bit on every run. The
star is drawn to one scale, evenly bright; a dome master is azimuthal equidistant
with the front below.

Caution: pictures that flash more than three times in a second can trigger seizures
(WCAG 2.2, 2.3.1). Collapses and thermal pulses change within a frame or two: watch
the sequence before an audience does, and fade. Bright projections dazzle.

Example:
  longember frames demo:sunlike_five_worlds --out frames --subject strip --size 640 --seconds 0.1";

/// A star's whole life and the fate of its planets, at any moment, with sources
///
/// Without a sub-command the window opens.
#[derive(Debug, Parser)]
#[command(
    name = "longember",
    version = VERSION.as_str(),
    args_conflicts_with_subcommands = true,
    max_term_width = 80,
    after_help = AFTER_HELP
)]
pub(super) struct Arguments {
    /// Scenario to open in the window: a file or demo:NAME; the demo if none is named
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: Option<ScenarioSource>,
    /// Who draws the window: auto takes OpenGL where it works
    #[arg(long, value_name = "WHO", default_value = "auto", value_parser = graphics_parser())]
    pub(super) graphics: GraphicsChoice,
    /// What to do without a window.
    #[command(subcommand)]
    pub(super) command: Option<Command>,
}

/// A sub-command.
#[derive(Debug, Subcommand)]
pub(super) enum Command {
    /// Everything about a scenario at one moment
    #[command(after_help = "Example:\n  longember state demo:sunlike_five_worlds --at 4.57Gyr")]
    State(StateArguments),
    /// Everything about a star without planets at one moment, no file needed
    #[command(after_help = "Example:\n  longember star --mass 2.5 --at 400Myr --format json")]
    Star(StarArguments),
    /// The whole history of a scenario as a table
    #[command(after_help = "Example:\n  longember table demo:sunlike_five_worlds --points 200 --spacing paced")]
    Table(TableArguments),
    /// The dated events of star and planets
    #[command(after_help = "Example:\n  longember events demo:sunlike_five_worlds")]
    Events(EventsArguments),
    /// A figure in publication style: SVG, PDF or PNG
    #[command(after_help = "Example:\n  longember figure demo:sunlike_five_worlds --plot distance")]
    Figure(FigureArguments),
    /// A fact sheet on one moment or several, every number with its source
    #[command(after_help = "Example:\n  longember sheet demo:sunlike_five_worlds --at 4.57Gyr --at 7.6Gyr")]
    Sheet(SheetArguments),
    /// Judge the statements of a scenario: exit code 0 if none fails, 1 if one does not hold
    #[command(after_help = CHECK_HELP)]
    Check(CheckArguments),
    /// A show as a numbered sequence of pictures, flat or for a dome
    #[command(after_help = FRAMES_HELP)]
    Frames(FramesArguments),
    /// A show as a table, one line for every frame, with warnings of flashes and jumps
    #[command(after_help = "Example:\n  longember cues demo:sunlike_five_worlds --fps 25 --planet Talune")]
    Cues(CuesArguments),
    /// List the built-in scenarios, or write one as a file to start from
    #[command(after_help = "Example:\n  longember demo sunlike_five_worlds")]
    Demo(DemoArguments),
    /// Every method in use, with its paper, range and accuracy
    #[command(after_help = "Example:\n  longember sources --format json")]
    Sources(SourcesArguments),
}

/// `state`.
#[derive(Args, Debug)]
pub(super) struct StateArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// The moment: 4.57Gyr, "3 trillion years", now, event:"largest radius"
    #[arg(long, value_name = "TIME", allow_hyphen_values = true)]
    pub(super) at: String,
    /// Form of the result
    #[arg(long, value_enum, default_value_t)]
    pub(super) format: PageFormat,
}

/// `star`.
#[derive(Args, Debug)]
pub(super) struct StarArguments {
    /// Mass when the star reaches the main sequence, solar masses
    #[arg(long, value_name = "MSUN", allow_hyphen_values = true)]
    pub(super) mass: f64,
    /// The moment: 4.57Gyr, "3 trillion years", event:"largest radius"
    #[arg(long, value_name = "TIME", allow_hyphen_values = true)]
    pub(super) at: String,
    /// Metallicity [Fe/H], dex; 0 is the Sun's
    #[arg(long, value_name = "DEX", default_value_t = 0.0, allow_hyphen_values = true)]
    pub(super) metallicity: f64,
    /// Form of the result
    #[arg(long, value_enum, default_value_t)]
    pub(super) format: PageFormat,
}

/// `table`.
#[derive(Args, Debug)]
pub(super) struct TableArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// First moment; birth if left out (five decades before the end with log spacing)
    #[arg(long, value_name = "TIME", allow_hyphen_values = true)]
    pub(super) from: Option<String>,
    /// Last moment; the end of what the window shows if left out
    #[arg(long, value_name = "TIME", allow_hyphen_values = true)]
    pub(super) to: Option<String>,
    /// Number of rows, 2 to 100000; 400 if left out
    #[arg(long, value_name = "N")]
    pub(super) points: Option<usize>,
    /// How the rows are spread over time; paced gives every visible change a similar share, nodes are the moments the
    /// life was computed at
    #[arg(long, value_enum, default_value_t = RowsArgument(Some(TimeScale::Paced)))]
    pub(super) spacing: RowsArgument,
    /// Only these columns, in this order, parted by commas; all if left out
    #[arg(long, value_name = "A,B,C", value_delimiter = ',')]
    pub(super) columns: Vec<String>,
    /// Form of the result; if left out, the extension of --out decides, else csv
    #[arg(long, value_enum)]
    pub(super) format: Option<TableFormat>,
    /// Where the result goes.
    #[command(flatten)]
    pub(super) destination: Destination,
}

/// `events`.
#[derive(Args, Debug)]
pub(super) struct EventsArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// Only the events of this body: star, or a planet's name
    #[arg(long, value_name = "NAME")]
    pub(super) body: Option<String>,
    /// Only events of this kind; may be given several times
    #[arg(long, value_enum)]
    pub(super) kind: Vec<EventGroupArgument>,
    /// Form of the result; if left out, the extension of --out decides, else text
    #[arg(long, value_enum)]
    pub(super) format: Option<EventsFormat>,
    /// Where the result goes.
    #[command(flatten)]
    pub(super) destination: Destination,
}

/// `figure`.
#[derive(Args, Debug)]
pub(super) struct FigureArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// What to draw
    #[arg(long, value_enum, value_name = "NAME")]
    pub(super) plot: PlotArgument,
    /// The moment: 4.57Gyr, "3 trillion years", now, event:"largest radius"
    #[arg(long, value_name = "TIME", default_value = "now", allow_hyphen_values = true)]
    pub(super) at: String,
    /// Whose sky or climate to draw; the first with air, or with water, if left out
    #[arg(long, value_name = "NAME")]
    pub(super) planet: Option<String>,
    /// Scale of the time axis
    #[arg(long, value_enum, default_value_t = SpacingArgument(TimeScale::Paced))]
    pub(super) scale: SpacingArgument,
    /// Width and height in pixels, such as 960x600; what suits the plot if left out
    #[arg(long, value_name = "WxH", value_parser = sides)]
    pub(super) size: Option<Sides>,
    /// Dark ink on white, or light ink on near-black
    #[arg(long, value_enum, default_value_t = LookArgument(Look::Light))]
    pub(super) theme: LookArgument,
    /// Form of the result; if left out, the extension of --out decides, else svg
    #[arg(long, value_enum)]
    pub(super) format: Option<FigureFormat>,
    /// Where the result goes.
    #[command(flatten)]
    pub(super) destination: Destination,
}

/// `frames`.
#[derive(Args, Debug)]
pub(super) struct FramesArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// Folder for the frames; it is made if it is not there
    #[arg(long, value_name = "DIR")]
    pub(super) out: PathBuf,
    /// What is shown: the star's disc, a planet's sky, the life strip, or another plot
    #[arg(long, value_enum, value_name = "WHAT", default_value = "star")]
    pub(super) subject: SubjectArgument,
    /// Width of a frame in pixels; a flat one is 16:9, a dome master square
    #[arg(long, value_name = "N", default_value_t = 1024)]
    pub(super) size: u32,
    /// Shape of a frame
    #[arg(long, value_enum, default_value_t)]
    pub(super) shape: ShapeArgument,
    /// Form of a frame; exr holds linear light, brighter than white where it is
    #[arg(long, value_enum, default_value_t)]
    pub(super) format: FrameFormatArgument,
    /// Frames a second: 24, 25, 30, 29.97, 60
    #[arg(long, value_name = "RATE", default_value = "30", value_parser = FrameRate::parse)]
    pub(super) fps: FrameRate,
    /// First moment of one sweep; birth if left out
    #[arg(long, value_name = "TIME", allow_hyphen_values = true)]
    pub(super) from: Option<String>,
    /// Last moment of one sweep; the end of what the window shows if left out
    #[arg(long, value_name = "TIME", allow_hyphen_values = true)]
    pub(super) to: Option<String>,
    /// Length of one sweep in seconds; 30 if left out
    #[arg(long, value_name = "S", allow_hyphen_values = true)]
    pub(super) seconds: Option<f64>,
    /// How one sweep runs through time
    #[arg(long, value_enum, default_value_t = PaceArgument(Transition::Paced))]
    pub(super) pace: PaceArgument,
    /// Whose sky or climate is shown; the first with air, or with water, if left out
    #[arg(long, value_name = "NAME")]
    pub(super) planet: Option<String>,
    /// Altitude of the star in that sky, degrees
    #[arg(long, value_name = "DEG", default_value_t = 30.0, allow_hyphen_values = true)]
    pub(super) altitude: f64,
    /// Width of the field about the star, solar radii; what holds its largest if left out
    #[arg(long, value_name = "RSUN", allow_hyphen_values = true)]
    pub(super) field: Option<f64>,
    /// Only the Kth of N parts, for machines that share the work
    #[arg(long, value_name = "K/N", default_value = "1/1", value_parser = Part::parse)]
    pub(super) part: Part,
    /// Replace files that are no frames of this sequence
    #[arg(long)]
    pub(super) force: bool,
}

/// A part of a sequence.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Part {
    /// Which one, counted from 1.
    number: usize,
    /// Of how many.
    count: usize,
}

impl Part {
    /// Reads `2/5`.
    fn parse(text: &str) -> Result<Self, String> {
        let whole = |digits: &str| digits.trim().parse::<usize>().ok();
        let found = text.split_once('/').and_then(|(number, count)| Some((whole(number)?, whole(count)?)));
        match found {
            Some((number, count)) if number >= 1 && number <= count => Ok(Self { number, count }),
            _ => Err("write which part of how many, such as 2/5, from 1/5 to 5/5".to_owned()),
        }
    }

    /// This part of a whole: all parts together are the whole, and no two share anything.
    pub(super) fn of<T>(self, all: &[T]) -> &[T] {
        let border = |number: usize| (all.len() as u128 * number as u128 / self.count as u128) as usize;
        &all[border(self.number - 1)..border(self.number)]
    }
}

/// What frames show, as an argument.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct SubjectArgument {
    key: &'static str,
    /// The subject; of a sky the planet is chosen elsewhere.
    pub(super) subject: FrameSubject,
}

impl ValueEnum for SubjectArgument {
    fn value_variants<'a>() -> &'a [Self] {
        static ALL: LazyLock<Vec<SubjectArgument>> = LazyLock::new(|| {
            let mut all = vec![
                SubjectArgument { key: "star", subject: FrameSubject::Star },
                SubjectArgument { key: "sky", subject: FrameSubject::Sky { planet: 0, view: SkyView::default() } },
            ];
            all.extend(Plot::all().into_iter().filter(|(_, plot)| *plot != Plot::Sky).map(|(key, plot)| {
                let key = if plot == Plot::LifeStrip { "strip" } else { key };
                SubjectArgument { key, subject: FrameSubject::Figure { plot, planet: None } }
            }));
            all
        });
        &ALL
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.key))
    }
}

/// A shape of frames as an argument.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub(super) struct ShapeArgument(pub(super) Shape);

impl ValueEnum for ShapeArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[Self(Shape::Flat), Self(Shape::Dome)]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.key()))
    }
}

/// A form of frames as an argument.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub(super) struct FrameFormatArgument(pub(super) FrameFormat);

impl ValueEnum for FrameFormatArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[Self(FrameFormat::Png8), Self(FrameFormat::Png16), Self(FrameFormat::Exr)]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.key()))
    }
}

/// How a sweep runs through time, as an argument.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct PaceArgument(pub(super) Transition);

impl ValueEnum for PaceArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[Self(Transition::Paced), Self(Transition::Steady), Self(Transition::SteadyLog), Self(Transition::Cut)]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.key()).help(self.0.name()))
    }
}

/// `sheet`.
#[derive(Args, Debug)]
pub(super) struct SheetArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// A moment: 4.57Gyr, now, event:"largest radius"; may be given several times
    #[arg(long, value_name = "TIME", required = true, allow_hyphen_values = true)]
    pub(super) at: Vec<String>,
    /// Form of the result; if left out, the extension of --out decides, else markdown
    #[arg(long, value_enum)]
    pub(super) format: Option<SheetFormat>,
    /// Where the result goes.
    #[command(flatten)]
    pub(super) destination: Destination,
}

/// Form of a fact sheet.
#[derive(Clone, Copy, Debug, PartialEq, Eq, ValueEnum)]
pub(super) enum SheetFormat {
    /// A page with figures that needs nothing else and prints well.
    Html,
    /// Headings, tables and links.
    Markdown,
    /// Lines of at most 80 columns.
    Text,
}

/// Form of a figure.
#[derive(Clone, Copy, Debug, PartialEq, Eq, ValueEnum)]
pub(super) enum FigureFormat {
    /// Lines and text, of any size.
    Svg,
    /// A page for print, its text as text.
    Pdf,
    /// Pixels.
    Png,
}

/// A plot as an argument.
#[derive(Clone, Debug, PartialEq, Eq)]
pub(super) struct PlotArgument {
    key: &'static str,
    /// The plot.
    pub(super) plot: Plot,
}

impl ValueEnum for PlotArgument {
    fn value_variants<'a>() -> &'a [Self] {
        static ALL: LazyLock<Vec<PlotArgument>> =
            LazyLock::new(|| Plot::all().into_iter().map(|(key, plot)| PlotArgument { key, plot }).collect());
        &ALL
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.key))
    }
}

/// A look of figures as an argument.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct LookArgument(pub(super) Look);

impl ValueEnum for LookArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[Self(Look::Light), Self(Look::Dark)]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.key()))
    }
}

/// Width and height as they were written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Sides(pub(super) [u32; 2]);

/// Reads `960x600`.
fn sides(text: &str) -> Result<Sides, String> {
    let side = |digits: &str| digits.trim().parse::<u32>().ok();
    let found = text.split_once(['x', 'X', '×']).and_then(|(width, height)| Some(Sides([side(width)?, side(height)?])));
    found.ok_or_else(|| "write width and height in pixels, such as 960x600".to_owned())
}

/// `check`.
#[derive(Args, Debug)]
pub(super) struct CheckArguments {
    /// A file, demo:NAME, or - for standard input; the demo if none is named
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: Option<ScenarioSource>,
    /// Judge this line instead of those of the scenario; may be given several times
    #[arg(long, value_name = "LINE", allow_hyphen_values = true)]
    pub(super) statement: Vec<String>,
    /// Form of the result
    #[arg(long, value_enum, default_value_t)]
    pub(super) format: PageFormat,
}

/// `cues`.
#[derive(Args, Debug)]
pub(super) struct CuesArguments {
    /// A file, demo:NAME, or - for standard input
    #[arg(value_name = "SCENARIO", value_parser = source_parser())]
    pub(super) scenario: ScenarioSource,
    /// Frames per second: a whole number, 23.976, 29.97, 59.94, or a ratio
    #[arg(long, value_name = "RATE", default_value = "30", value_parser = FrameRate::parse)]
    pub(super) fps: FrameRate,
    /// A planet whose figures are wanted; may be given several times; all if left out
    #[arg(long, value_name = "NAME")]
    pub(super) planet: Vec<String>,
    /// Where the result goes.
    #[command(flatten)]
    pub(super) destination: Destination,
}

/// `demo`.
#[derive(Args, Debug)]
pub(super) struct DemoArguments {
    /// The scenario to write; all are listed if none is named
    #[arg(value_name = "NAME")]
    pub(super) name: Option<String>,
    /// Where the result goes.
    #[command(flatten)]
    pub(super) destination: Destination,
}

/// `sources`.
#[derive(Args, Debug)]
pub(super) struct SourcesArguments {
    /// Form of the result
    #[arg(long, value_enum, default_value_t)]
    pub(super) format: PageFormat,
}

/// Form of a page.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, ValueEnum)]
pub(super) enum PageFormat {
    /// For people.
    #[default]
    Text,
    /// For programs.
    Json,
}

/// Form of a table.
#[derive(Clone, Copy, Debug, PartialEq, Eq, ValueEnum)]
pub(super) enum TableFormat {
    /// Comma-separated values.
    Csv,
    /// Comma-separated values under a header with units.
    Ecsv,
    /// One object per row.
    Json,
}

/// Form of a list of events.
#[derive(Clone, Copy, Debug, PartialEq, Eq, ValueEnum)]
pub(super) enum EventsFormat {
    /// For people.
    Text,
    /// Comma-separated values.
    Csv,
    /// For programs.
    Json,
}

/// A time scale as an argument.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct SpacingArgument(pub(super) TimeScale);

impl ValueEnum for SpacingArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[Self(TimeScale::Linear), Self(TimeScale::Log), Self(TimeScale::Paced)]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.key()))
    }
}

/// How the rows of a table are spread over time; nothing for the moments that the life was computed at.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct RowsArgument(pub(super) Option<TimeScale>);

impl ValueEnum for RowsArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[Self(Some(TimeScale::Linear)), Self(Some(TimeScale::Log)), Self(Some(TimeScale::Paced)), Self(None)]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.map_or("nodes", TimeScale::key)))
    }
}

/// A group of events as an argument.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct EventGroupArgument(pub(super) EventGroup);

impl ValueEnum for EventGroupArgument {
    fn value_variants<'a>() -> &'a [Self] {
        &[
            Self(EventGroup::Star),
            Self(EventGroup::Colour),
            Self(EventGroup::Zone),
            Self(EventGroup::Climate),
            Self(EventGroup::Orbit),
            Self(EventGroup::Air),
        ]
    }

    fn to_possible_value(&self) -> Option<PossibleValue> {
        Some(PossibleValue::new(self.0.key()).help(self.0.name()))
    }
}

fn source_parser() -> impl TypedValueParser<Value = ScenarioSource> {
    OsStringValueParser::new().map(ScenarioSource::parse)
}

fn graphics_parser() -> impl TypedValueParser<Value = GraphicsChoice> {
    PossibleValuesParser::new(GraphicsChoice::ALL.map(|(name, _)| name))
        .map(|name| GraphicsChoice::from_name(&name).unwrap_or_default())
}

#[cfg(test)]
mod tests {
    use super::*;
    use clap::CommandFactory;

    #[test]
    fn the_definition_is_sound() {
        Arguments::command().debug_assert();
    }

    #[test]
    fn every_sub_command_shows_an_example_of_itself() {
        for command in Arguments::command().get_subcommands().filter(|command| command.get_name() != "help") {
            let after = command.get_after_help().map(ToString::to_string).unwrap_or_default();
            assert!(after.contains(&format!("longember {}", command.get_name())), "{}", command.get_name());
        }
    }
}
