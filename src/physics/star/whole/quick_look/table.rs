//! The grid as it is shipped: sixteen bits a number.
//!
//! The file begins with the eight bytes of [`MAGIC`], then holds one record after another, all numbers little-endian:
//! mass, metallicity, contraction time and the five lengths of stretches as `f64`, surface and giant flag as one byte
//! each, the steps of age as `f32`, then for each column its least and largest value as `f32` and the points as `u16`
//! between them.

use super::sample::{COLUMNS, COUNT, Sampled};
use crate::physics::star::convective::{ConvectiveInput, Life, SurfaceOpacity};

/// First bytes of the file: its form.
const MAGIC: &[u8; 8] = b"LRDGRID1";
/// Bytes of a record.
const RECORD: usize = 8 * 8 + 2 + 4 * COUNT + COLUMNS * (8 + 2 * COUNT);

/// Masses of the grid, solar masses; close together where blue dwarfs turn into giants.
pub const GRID_MASSES_MSUN: [f64; 31] = [
    0.07, 0.072, 0.075, 0.08, 0.085, 0.09, 0.10, 0.11, 0.12, 0.13, 0.14, 0.15, 0.16, 0.17, 0.18, 0.19, 0.20, 0.205,
    0.21, 0.215, 0.22, 0.235, 0.25, 0.275, 0.30, 0.32, 0.34, 0.36, 0.40, 0.45, 0.50,
];
/// Metallicities of the grid, dex.
pub const GRID_METALLICITIES_DEX: [f64; 5] = [-2.0, -1.0, -0.4, 0.0, 0.2];

/// A life computed for the grid.
#[derive(Clone, Debug)]
pub struct GridLife {
    /// What it was computed from.
    pub input: ConvectiveInput,
    /// The surface it was computed with.
    pub surface: SurfaceOpacity,
    /// The life.
    pub life: Life,
}

/// A record of the grid.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Entry {
    pub(super) mass_msun: f64,
    pub(super) metallicity_dex: f64,
    pub(super) surface: SurfaceOpacity,
    pub(super) sampled: Sampled,
}

/// The grid as bytes for the file. Lives that do not reach the black dwarf are left out.
#[must_use]
pub fn table_bytes(lives: &[GridLife]) -> Vec<u8> {
    let mut bytes = MAGIC.to_vec();
    for GridLife { input, surface, life } in lives {
        if let Some(sampled) = Sampled::new(life) {
            let (mass_msun, metallicity_dex) = (input.mass_msun, input.metallicity_dex);
            write(&mut bytes, &Entry { mass_msun, metallicity_dex, surface: *surface, sampled });
        }
    }
    bytes
}

fn write(bytes: &mut Vec<u8>, entry: &Entry) {
    let sampled = &entry.sampled;
    let head = [entry.mass_msun, entry.metallicity_dex, sampled.contraction_yr];
    for number in head.iter().chain(&sampled.lengths_yr) {
        bytes.extend(number.to_le_bytes());
    }
    bytes.push(u8::from(entry.surface == SurfaceOpacity::Of1997));
    bytes.push(u8::from(sampled.is_giant));
    for step in &sampled.steps {
        bytes.extend(single(*step).to_le_bytes());
    }
    for column in 0..COLUMNS {
        let values = || sampled.points.iter().map(|point| point[column]);
        let (least, most) =
            (single(values().fold(f64::INFINITY, f64::min)), single(values().fold(f64::NEG_INFINITY, f64::max)));
        bytes.extend(least.to_le_bytes());
        bytes.extend(most.to_le_bytes());
        for value in values() {
            bytes.extend(sixteen_bits(value, f64::from(least), f64::from(most)).to_le_bytes());
        }
    }
}

/// The seven digits that the file keeps.
fn single(value: f64) -> f32 {
    value as f32
}

/// The place of a value between the least and the most of its column.
fn sixteen_bits(value: f64, least: f64, most: f64) -> u16 {
    if most <= least {
        return 0;
    }
    (f64::from(u16::MAX) * (value - least) / (most - least)).round().clamp(0.0, f64::from(u16::MAX)) as u16
}

/// Reads every record; nothing if the bytes are no grid of this form.
pub(super) fn read(bytes: &[u8]) -> Option<Vec<Entry>> {
    let records = bytes.strip_prefix(MAGIC)?;
    if records.len() % RECORD != 0 {
        return None;
    }
    records.chunks_exact(RECORD).map(read_record).collect()
}

fn read_record(record: &[u8]) -> Option<Entry> {
    let mut rest = record;
    let mut doubles = [0.0; 8];
    for number in &mut doubles {
        *number = f64::from_le_bytes(take(&mut rest)?);
    }
    let [mass_msun, metallicity_dex, contraction_yr, lengths_yr @ ..] = doubles;
    let [is_of_1997, is_giant] = take::<2>(&mut rest)?;
    let mut steps = Vec::with_capacity(COUNT);
    for _ in 0..COUNT {
        steps.push(f64::from(f32::from_le_bytes(take(&mut rest)?)));
    }
    let mut points = vec![[0.0; COLUMNS]; COUNT];
    for column in 0..COLUMNS {
        let least = f64::from(f32::from_le_bytes(take(&mut rest)?));
        let most = f64::from(f32::from_le_bytes(take(&mut rest)?));
        for point in &mut points {
            let place = f64::from(u16::from_le_bytes(take(&mut rest)?)) / f64::from(u16::MAX);
            point[column] = least + place * (most - least);
        }
    }
    let surface = if is_of_1997 == 1 { SurfaceOpacity::Of1997 } else { SurfaceOpacity::Modern };
    let sampled = Sampled { lengths_yr, contraction_yr, is_giant: is_giant == 1, steps, points };
    Some(Entry { mass_msun, metallicity_dex, surface, sampled })
}

fn take<const N: usize>(bytes: &mut &[u8]) -> Option<[u8; N]> {
    let (first, rest) = bytes.split_first_chunk::<N>()?;
    *bytes = rest;
    Some(*first)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn entry() -> Entry {
        let points = (0..COUNT).map(|k| std::array::from_fn(|column| (k * (column + 1)) as f64 / 7.0 - 3.0)).collect();
        let sampled = Sampled {
            lengths_yr: [1e12, 2e11, 3e10, 4e9, 5e11],
            contraction_yr: 1e9,
            is_giant: true,
            steps: (0..COUNT).map(|k| k as f64 / 1e3).collect(),
            points,
        };
        Entry { mass_msun: 0.25, metallicity_dex: -0.4, surface: SurfaceOpacity::Of1997, sampled }
    }

    #[test]
    fn a_record_comes_back_to_sixteen_bits() {
        let mut bytes = MAGIC.to_vec();
        write(&mut bytes, &entry());
        assert_eq!(bytes.len(), MAGIC.len() + RECORD);
        let back = read(&bytes).expect("a grid");
        assert_eq!(back.len(), 1);
        assert_eq!((back[0].mass_msun, back[0].metallicity_dex, back[0].surface), (0.25, -0.4, SurfaceOpacity::Of1997));
        assert_eq!(back[0].sampled.lengths_yr, entry().sampled.lengths_yr);
        for (is, was) in back[0].sampled.points.iter().zip(entry().sampled.points) {
            for (column, (a, b)) in is.iter().zip(was).enumerate() {
                let range = (COUNT * (column + 1)) as f64 / 7.0;
                assert!((a - b).abs() < 1e-5 * range, "{column}: {a} {b}");
            }
        }
    }

    #[test]
    fn other_bytes_are_no_grid() {
        assert_eq!(read(b""), None);
        assert_eq!(read(b"LRDGRID1x"), None);
        assert_eq!(read(MAGIC), Some(Vec::new()));
    }
}
