//! Which known word a mistyped one was meant to be.

/// The known word that is likest to `written`, if one is like it at all.
///
/// Words that differ only in the unit at their end are alike; else up to a third of the letters may differ.
#[must_use]
pub fn likest<'k>(written: &str, known: &[&'k str]) -> Option<&'k str> {
    if written.chars().count() > 60 {
        return None;
    }
    let lower = written.to_lowercase();
    let nearest = known.iter().map(|word| (differences(&lower, &word.to_lowercase()), *word)).min();
    let same_stem = || known.iter().copied().find(|word| stem(word).is_some() && stem(word) == stem(&lower));
    let same_start = || {
        known
            .iter()
            .copied()
            .find(|word| lower.len() >= 4 && word.strip_prefix(&lower).is_some_and(|rest| rest.starts_with('_')))
    };
    match nearest {
        Some((count, word)) if count <= 1 || count * 3 <= word.chars().count() => Some(word),
        _ => same_stem().or_else(same_start),
    }
}

/// The part before the unit.
fn stem(word: &str) -> Option<&str> {
    word.rsplit_once('_').map(|(stem, _)| stem)
}

/// The number of letters to change, add or remove (Levenshtein's distance).
fn differences(left: &str, right: &str) -> usize {
    let right: Vec<char> = right.chars().collect();
    let mut row: Vec<usize> = (0..=right.len()).collect();
    for (index, letter) in left.chars().enumerate() {
        let mut diagonal = row[0];
        row[0] = index + 1;
        for (column, other) in right.iter().enumerate() {
            let changed = diagonal + usize::from(letter != *other);
            diagonal = row[column + 1];
            row[column + 1] = changed.min(diagonal + 1).min(row[column] + 1);
        }
    }
    row[right.len()]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn slips_units_and_case_are_seen_through() {
        let keys = ["name", "semi_major_axis_au", "eccentricity", "mass_mearth", "bond_albedo"];
        assert_eq!(likest("bond_albeod", &keys), Some("bond_albedo"));
        assert_eq!(likest("Eccentricity", &keys), Some("eccentricity"));
        assert_eq!(likest("semi_major_axis_km", &keys), Some("semi_major_axis_au"));
        assert_eq!(likest("mass_msun", &keys), Some("mass_mearth"));
        assert_eq!(likest("mass", &keys), Some("mass_mearth"));
        assert_eq!(likest("colour", &keys), None);
        assert_eq!(likest("", &[]), None);
    }
}
