//! The shows that come with the program run on their own histories and harm nobody.

use longember::document::built_in;
use longember::system::History;
use longember::system::cues::{FrameRate, Schedule, ShowWarning, warnings};

#[test]
fn every_show_runs_without_a_flash() {
    let mut count = 0;
    for built_in in built_in::all() {
        let scenario = built_in.scenario().expect("sound");
        if scenario.cues.is_empty() {
            continue;
        }
        count += 1;
        let history = History::compute(scenario.system.clone()).expect("computed");
        let schedule = Schedule::new(&scenario.cues, &history).expect("a show");
        assert!(schedule.length_s() >= 30.0);
        for rate in ["24", "30", "60"] {
            let found = warnings(&schedule, &history, FrameRate::parse(rate).expect("known"));
            let harmful: Vec<String> =
                found.iter().filter(|warning| warning.is_harmful()).map(ShowWarning::text).collect();
            assert_eq!(harmful, [""; 0], "{}", built_in.name);
        }
    }
    assert!(count >= 1);
}
