//! Tables of climates that planets of the same air, tilt and heat transport share.

use super::super::range::OutOfRange;
use super::ice_line_model::WaterWorldAir;
use super::table::ClimateTable;
use std::sync::Arc;

/// Tables that have been asked for, kept by whoever computes more than one planet or the same one again.
///
/// A table depends on air, tilt and heat transport alone, so that an edit of anything else finds its thresholds again.
#[derive(Clone, Debug, Default)]
pub struct ClimateTables {
    kept: Vec<Kept>,
}

#[derive(Clone, Debug)]
struct Kept {
    air: WaterWorldAir,
    table: Arc<ClimateTable>,
    is_in_use: bool,
}

impl ClimateTables {
    /// The table for an air, made anew where there is none yet.
    ///
    /// # Errors
    /// [`OutOfRange`] for a field of `air` out of its range.
    pub fn of(&mut self, air: &WaterWorldAir) -> Result<Arc<ClimateTable>, OutOfRange> {
        if let Some(kept) = self.kept.iter_mut().find(|kept| kept.air == *air) {
            kept.is_in_use = true;
            return Ok(Arc::clone(&kept.table));
        }
        let alike = self.kept.iter().find(|kept| {
            (kept.air.obliquity_deg, kept.air.heat_transport_w_m2_k) == (air.obliquity_deg, air.heat_transport_w_m2_k)
        });
        let table = Arc::new(match alike {
            Some(kept) => ClimateTable::sharing(&kept.table, air.carbon_dioxide_bar)?,
            None => ClimateTable::new(air)?,
        });
        self.kept.push(Kept { air: *air, table: Arc::clone(&table), is_in_use: true });
        Ok(table)
    }

    /// Marks a table that was taken from here, or from what this was made of, as in use.
    pub(crate) fn keep(&mut self, table: &Arc<ClimateTable>) {
        for kept in self.kept.iter_mut().filter(|kept| Arc::ptr_eq(&kept.table, table)) {
            kept.is_in_use = true;
        }
    }

    /// The same tables, none of them in use yet: what an edited system starts from.
    #[must_use]
    pub fn to_reuse(&self) -> Self {
        let kept = self.kept.iter().map(|kept| Kept { is_in_use: false, ..kept.clone() });
        Self { kept: kept.collect() }
    }

    /// Forgets the tables that nobody has asked for.
    pub fn drop_unused(&mut self) {
        self.kept.retain(|kept| kept.is_in_use);
    }

    /// Works out every curve of every table ahead of its being read.
    pub fn prepare_all(&self) {
        for kept in &self.kept {
            kept.table.prepare_all();
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_table_is_shared_and_forgotten_when_nobody_asks() {
        let mut tables = ClimateTables::default();
        let (earth, tilted) =
            (WaterWorldAir::default(), WaterWorldAir { obliquity_deg: 60.0, ..WaterWorldAir::default() });
        let first = tables.of(&earth).expect("in range");
        let second = tables.of(&tilted).expect("in range");
        assert!(Arc::ptr_eq(&first, &tables.of(&earth).expect("in range")));
        let mut edited = tables.to_reuse();
        assert!(Arc::ptr_eq(&second, &edited.of(&tilted).expect("in range")));
        edited.drop_unused();
        assert!(!Arc::ptr_eq(&first, &edited.of(&earth).expect("in range")), "it was no longer asked for");
        assert!(tables.of(&WaterWorldAir { obliquity_deg: f64::NAN, ..earth }).is_err());
    }

    #[test]
    fn a_table_beside_another_is_the_same_as_one_alone() {
        let mut tables = ClimateTables::default();
        let air = |carbon_dioxide_bar| WaterWorldAir { carbon_dioxide_bar, ..WaterWorldAir::default() };
        tables.of(&air(1e-3)).expect("in range");
        let beside = tables.of(&air(0.1)).expect("in range").limits(5772.0);
        assert_eq!(beside, ClimateTable::new(&air(0.1)).and_then(|table| table.limits(5772.0)));
    }
}
