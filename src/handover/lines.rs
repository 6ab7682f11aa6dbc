//! Text for terminals: lines that fit into 80 columns.

/// Width that every line keeps to where its words allow it.
pub(super) const WIDTH: usize = 80;

/// Number of characters, which is the width in a terminal for all text of ours.
pub(super) fn width(text: &str) -> usize {
    text.chars().count()
}

/// Appends `text` broken between words so that every line fits, the first line after `lead`, the others indented as deep.
pub(super) fn push_wrapped(page: &mut String, lead: &str, text: &str) {
    let indent = width(lead);
    page.push_str(lead);
    let mut used = indent;
    let mut at_start = true;
    for word in text.split_whitespace() {
        if !at_start && used + 1 + width(word) > WIDTH {
            page.push('\n');
            page.extend(std::iter::repeat_n(' ', indent));
            used = indent;
            at_start = true;
        }
        if !at_start {
            page.push(' ');
            used += 1;
        }
        page.push_str(word);
        used += width(word);
        at_start = false;
    }
    page.push('\n');
}

/// `text` followed by spaces up to a width.
pub(super) fn padded(text: &str, to: usize) -> String {
    let gap = to.saturating_sub(width(text));
    format!("{text}{}", " ".repeat(gap))
}

/// Appends columns of text, each as wide as its widest cell, two spaces apart, without trailing spaces.
pub(super) fn push_columns(page: &mut String, indent: usize, rows: &[Vec<String>]) {
    let count = rows.iter().map(Vec::len).max().unwrap_or(0);
    let widths: Vec<usize> = (0..count)
        .map(|column| rows.iter().filter_map(|row| row.get(column)).map(|cell| width(cell)).max().unwrap_or(0))
        .collect();
    for row in rows {
        let mut line = " ".repeat(indent);
        for (cell, column_width) in row.iter().zip(&widths) {
            line.push_str(&padded(cell, column_width + 2));
        }
        page.push_str(line.trim_end());
        page.push('\n');
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn long_text_is_broken_between_words_and_indented() {
        let mut page = String::new();
        let words = "word ".repeat(40);
        push_wrapped(&mut page, "  note: ", &words);
        assert!(page.lines().all(|line| width(line) <= WIDTH && !line.ends_with(' ')));
        assert!(page.lines().skip(1).all(|line| line.starts_with("        word")));
        assert_eq!(page.split_whitespace().count(), 41);
    }

    #[test]
    fn a_word_too_long_for_a_line_stands_alone() {
        let mut page = String::new();
        push_wrapped(&mut page, "", &format!("a {} b", "x".repeat(100)));
        assert_eq!(page.lines().count(), 3);
    }

    #[test]
    fn columns_line_up_by_characters_not_bytes() {
        let mut page = String::new();
        let row = |cells: [&str; 3]| cells.map(str::to_owned).to_vec();
        push_columns(&mut page, 1, &[row(["L☉", "1", "a"]), row(["Luminosity", "1000", ""])]);
        assert_eq!(page, " L☉          1     a\n Luminosity  1000\n");
    }
}
