//! `frames`: numbered sequences that can be stopped, resumed and shared out.

use crate::program::{DEMO, command, names_in, refusal, run};
use std::collections::BTreeMap;
use std::fs;
use std::path::Path;
use std::process::Stdio;
use std::time::Duration;

/// A short show: ten frames of a small picture.
const SHORT: [&str; 8] = ["--size", "256", "--seconds", "0.3", "--from", "4 Gyr", "--to", "12.2 Gyr"];

fn frames(folder: &Path, more: &[&str]) -> String {
    let out = folder.to_str().expect("UTF-8");
    let finished = run([&["frames", DEMO, "--out", out], &SHORT[..], more].concat());
    assert_eq!((finished.code, finished.results.as_str()), (0, ""), "{}", finished.messages);
    finished.messages
}

/// Every file of a folder with its bytes.
fn content(folder: &Path) -> BTreeMap<String, Vec<u8>> {
    names_in(folder).into_iter().map(|name| (name.clone(), fs::read(folder.join(name)).expect("readable"))).collect()
}

#[test]
fn every_subject_shape_and_form_is_a_numbered_sequence_of_whole_pictures() {
    let folder = tempfile::tempdir().expect("a folder");
    for (subject, shape, format, extension, sides) in [
        ("star", "flat", "png8", "png", (256, 144)),
        ("star", "dome", "png16", "png", (256, 256)),
        ("sky", "dome", "exr", "exr", (256, 256)),
        ("sky", "flat", "png8", "png", (256, 144)),
        ("strip", "flat", "png8", "png", (256, 144)),
        ("distance", "dome", "png8", "png", (256, 256)),
    ] {
        let out = folder.path().join(format!("{subject}_{shape}_{format}"));
        let messages = frames(&out, &["--subject", subject, "--shape", shape, "--format", format]);
        assert!(messages.starts_with("10 frames of 10") && messages.contains("10 drawn"), "{messages}");
        let names: Vec<String> = (0..10).map(|number| format!("frame_{number:06}.{extension}")).collect();
        assert_eq!(names_in(&out), names);
        for name in names.iter().filter(|_| extension == "png") {
            let picture = image::open(out.join(name)).expect("a picture");
            assert_eq!((picture.width(), picture.height()), sides, "{subject} {shape}");
        }
        if extension == "exr" {
            let image = exr::prelude::read_first_rgba_layer_from_file(
                out.join(&names[0]),
                |size, _| vec![0.0_f32; size.area()],
                |reds, place, (red, _, _, _): (f32, f32, f32, f32)| reds[place.y() * 256 + place.x()] = red,
            );
            let image = image.expect("an EXR");
            assert_eq!((image.layer_data.size.x(), image.layer_data.size.y()), (256, 256));
            let reds = &image.layer_data.channel_data.pixels;
            assert!(reds.iter().all(|red| red.is_finite()) && reds.iter().any(|red| *red > 1.0), "light above white");
        }
    }
}

#[test]
fn parts_together_are_the_whole_and_a_second_run_keeps_everything() {
    let folder = tempfile::tempdir().expect("a folder");
    let (whole, shared) = (folder.path().join("whole"), folder.path().join("shared"));
    frames(&whole, &[]);
    for part in ["2/3", "1/3", "3/3"] {
        let messages = frames(&shared, &["--part", part]);
        assert!(messages.contains("frames of 10"), "{messages}");
    }
    assert_eq!(content(&whole), content(&shared));
    assert!(frames(&whole, &[]).contains("0 drawn") && frames(&whole, &[]).contains("10 kept"));
    // A frame that was spoilt is no frame of the sequence: it is replaced only when asked for.
    let spoilt = whole.join("frame_000004.png");
    let good = fs::read(&spoilt).expect("there");
    fs::write(&spoilt, &good[..good.len() / 2]).expect("written");
    let out = whole.to_str().expect("UTF-8");
    let words = [&["frames", DEMO, "--out", out], &SHORT[..]].concat();
    assert!(refusal(&words, 4).contains("frame_000004.png") && refusal(&words, 4).contains("--force"));
    assert!(frames(&whole, &["--force"]).contains("1 drawn"));
    assert_eq!(content(&whole), content(&shared));
}

#[test]
fn a_killed_run_leaves_whole_frames_and_resumes_to_the_same_sequence() {
    let folder = tempfile::tempdir().expect("a folder");
    let (whole, killed) = (folder.path().join("whole"), folder.path().join("killed"));
    let words = |out: &Path| {
        let out = out.to_str().expect("UTF-8").to_owned();
        ["frames", DEMO, "--subject", "strip", "--size", "640", "--seconds", "1", "--out"]
            .into_iter()
            .map(str::to_owned)
            .chain([out])
            .collect::<Vec<String>>()
    };
    assert_eq!(run(words(&whole)).code, 0);
    let mut child = command().args(words(&killed)).stderr(Stdio::null()).spawn().expect("the program starts");
    let is_frame = |name: &String| name.starts_with("frame_");
    let count = || if killed.is_dir() { names_in(&killed).iter().filter(|name| is_frame(name)).count() } else { 0 };
    while count() < 5 {
        assert!(child.try_wait().expect("known").is_none(), "it ended before it could be killed");
        std::thread::sleep(Duration::from_millis(2));
    }
    child.kill().expect("killed");
    child.wait().expect("gone");
    let (expected, found) = (content(&whole), content(&killed));
    assert!(found.len() < expected.len(), "it was too quick to be killed");
    for (name, bytes) in found.iter().filter(|(name, _)| is_frame(name)) {
        assert_eq!(bytes, &expected[name], "{name} is whole");
    }
    let finished = run(words(&killed));
    assert!(finished.code == 0 && !finished.messages.contains(" 0 kept"), "{}", finished.messages);
    let resumed: BTreeMap<_, _> = content(&killed).into_iter().filter(|(name, _)| is_frame(name)).collect();
    assert_eq!(resumed, expected);
}

#[test]
fn another_sequence_in_the_same_folder_is_not_mixed_in() {
    let folder = tempfile::tempdir().expect("a folder");
    frames(folder.path(), &[]);
    let before = content(folder.path());
    let out = folder.path().to_str().expect("UTF-8");
    let words = [&["frames", DEMO, "--out", out], &SHORT[..], &["--pace", "steady"]].concat();
    assert!(refusal(words, 4).contains("no frame of this sequence"));
    assert_eq!(content(folder.path()), before);
}

#[test]
fn what_is_no_show_is_refused_with_what_is() {
    let folder = tempfile::tempdir().expect("a folder");
    let out = folder.path().join("frames");
    let words = ["frames", DEMO, "--out", out.to_str().expect("UTF-8")];
    let with = |more: &[&'static str]| [&words[..], more].concat();
    for (more, code, words) in [
        (&["--size", "10"][..], 3, "256 to 8192"),
        (&["--altitude", "-5"], 3, "0 to 90"),
        (&["--field", "0"], 3, "solar radii"),
        (&["--seconds", "-1"], 3, "show time"),
        (&["--from", "event:nothing"], 3, "--from"),
        (&["--subject", "sky", "--planet", "Nobody"], 3, "Talune"),
    ] {
        assert!(refusal(with(more), code).contains(words), "{more:?}");
    }
    for more in [&["--part", "0/3"][..], &["--part", "4/3"], &["--part", "x"], &["--fps", "0"], &["--subject", "pie"]] {
        assert_eq!(run(with(more)).code, 2, "{more:?}");
    }
    assert!(!out.exists(), "nothing was made");
    let file = folder.path().join("file");
    fs::write(&file, "x").expect("written");
    let words = [&["frames", DEMO, "--out", file.to_str().expect("UTF-8")], &SHORT[..]].concat();
    assert!(refusal(words, 4).contains("can't be made"));
}

#[test]
fn the_help_warns_of_flashes() {
    let help = crate::program::result(["frames", "--help"]);
    assert!(help.contains("seizures") && help.contains("more than three times"), "{help}");
}
