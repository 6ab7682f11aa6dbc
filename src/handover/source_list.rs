//! Every method in use with its source, range and accuracy.

use super::lines::{padded, push_wrapped};
use crate::system::provenance::METHODS;
use crate::system::quantities::figures_of;
use serde_json::{Map, Value};

/// The methods for people.
#[must_use]
pub fn sources_text() -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", "Methods, with their sources, the range they hold in, and how good they are");
    for method in METHODS {
        page.push('\n');
        push_wrapped(&mut page, "", method.name);
        let figures = figures_of(method.key).map(|(_, name)| name).collect::<Vec<_>>().join(", ");
        let rows = [
            ("Relation", method.relation),
            ("Source", method.source),
            ("Valid for", method.valid_for),
            ("Accuracy", method.accuracy),
            ("Figures", figures.as_str()),
        ];
        for (label, text) in rows.into_iter().filter(|(_, text)| !text.is_empty()) {
            push_wrapped(&mut page, &format!("  {}", padded(label, 11)), text);
        }
    }
    page
}

/// The methods as JSON: an object with `methods`, each with the keys of the figures it gives.
#[must_use]
pub fn sources_json() -> String {
    let methods: Vec<Value> = METHODS
        .iter()
        .map(|method| {
            let mut object = Map::new();
            let texts = [
                ("method", method.key),
                ("name", method.name),
                ("relation", method.relation),
                ("source", method.source),
                ("valid_for", method.valid_for),
                ("accuracy", method.accuracy),
            ];
            object.extend(texts.map(|(key, text)| (key.to_owned(), Value::from(text))));
            let figures: Vec<Value> = figures_of(method.key).map(|(key, _)| Value::from(key)).collect();
            object.insert("figures".to_owned(), Value::Array(figures));
            Value::Object(object)
        })
        .collect();
    let mut root = Map::new();
    root.insert("methods".to_owned(), Value::Array(methods));
    format!("{:#}\n", Value::Object(root))
}

#[cfg(test)]
mod tests {
    use super::super::lines::width;
    use super::*;
    use crate::system::light_quantities::{PLANET_LIGHT, STAR_LIGHT};
    use crate::system::quantities::{PLANET, STAR};

    #[test]
    fn every_method_stands_in_both_forms() {
        let text = sources_text();
        let json: Value = serde_json::from_str(&sources_json()).expect("JSON");
        let methods = json["methods"].as_array().expect("a list");
        assert_eq!(methods.len(), METHODS.len());
        for (method, object) in METHODS.iter().zip(methods) {
            assert!(text.contains(method.name));
            assert_eq!(object["source"], method.source);
        }
        assert!(text.lines().all(|line| width(line) <= 80 && !line.ends_with(' ')), "{text}");
    }

    #[test]
    fn every_figure_is_named_under_its_method() {
        let json: Value = serde_json::from_str(&sources_json()).expect("JSON");
        let figures: usize = json["methods"]
            .as_array()
            .expect("a list")
            .iter()
            .map(|method| method["figures"].as_array().map_or(0, Vec::len))
            .sum();
        assert_eq!(figures, STAR.len() + PLANET.len() + STAR_LIGHT.len() + PLANET_LIGHT.len());
    }
}
