//! One figure as a sentence to paste, with its spread and its source.

use crate::system::provenance::method;

/// `At 4.600 billion years the luminosity of Veldane is 1.003 L☉ (± 5.0 %). Source: …`
#[derive(Clone, Debug)]
pub struct FigureSentence<'a> {
    /// Time since the star reached the main sequence, in words.
    pub time: &'a str,
    /// Whose figure it is.
    pub body: &'a str,
    /// Name of the figure.
    pub name: &'a str,
    /// Value with unit as text.
    pub value: &'a str,
    /// Spread as text, where one is known.
    pub spread: Option<&'a str>,
    /// Key of its method.
    pub method: &'a str,
}

impl FigureSentence<'_> {
    /// The sentence.
    #[must_use]
    pub fn text(&self) -> String {
        let spread = self.spread.map_or_else(String::new, |spread| format!(" ({spread})"));
        let mut name = self.name.to_owned();
        // Names begin with a capital in panels; inside a sentence only symbols keep it.
        if name.chars().nth(1).is_some_and(char::is_lowercase) {
            name = name[..1].to_lowercase() + &name[1..];
        }
        let source = method(self.method).map_or_else(String::new, |method| {
            format!(" Method: {}; source: {}.", method.name, method.source.trim_end_matches('.'))
        });
        format!(
            "{} after reaching the main sequence: {}, {name} {}{spread}.{source}",
            self.time,
            self.body,
            self.value.trim()
        )
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_sentence_says_who_when_how_much_and_why() {
        let sentence = FigureSentence {
            time: "4.600 billion years",
            body: "Veldane",
            name: "Luminosity",
            value: "1.003 L☉",
            spread: Some("± 5.0 %"),
            method: crate::system::quantities::STAR[0].method,
        };
        let text = sentence.text();
        assert!(
            text.starts_with(
                "4.600 billion years after reaching the main sequence: Veldane, luminosity 1.003 L☉ (± 5.0 %). Method: "
            ),
            "{text}"
        );
        assert!(text.contains("; source: ") && text.ends_with('.') && !text.ends_with(".."), "{text}");
    }
}
