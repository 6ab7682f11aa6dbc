//! From byte offsets to the line and column an editor shows.

/// The lines of a text.
#[derive(Debug)]
pub struct Lines<'t> {
    text: &'t str,
    starts: Vec<usize>,
}

impl<'t> Lines<'t> {
    /// Finds the lines of a text.
    #[must_use]
    pub fn new(text: &'t str) -> Self {
        let starts = std::iter::once(0).chain(text.match_indices('\n').map(|(at, _)| at + 1)).collect();
        Self { text, starts }
    }

    /// Line and column of a byte offset, both counted from 1, the column in characters.
    ///
    /// An offset past the end stands for the end, one inside a character for that character.
    #[must_use]
    pub fn line_and_column(&self, offset: usize) -> (usize, usize) {
        let offset = self.text.floor_char_boundary(offset);
        let line = self.starts.partition_point(|start| *start <= offset).max(1);
        let start = self.starts[line - 1];
        (line, self.text[start..offset].chars().count() + 1)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn columns_count_characters_and_the_end_has_a_place() {
        let lines = Lines::new("aé☉x\nb\n");
        assert_eq!(lines.line_and_column(0), (1, 1));
        assert_eq!(lines.line_and_column("aé☉".len()), (1, 4));
        assert_eq!(lines.line_and_column(2), (1, 2));
        assert_eq!(lines.line_and_column("aé☉x\n".len()), (2, 1));
        assert_eq!(lines.line_and_column(1000), (3, 1));
        assert_eq!(Lines::new("").line_and_column(5), (1, 1));
    }
}
