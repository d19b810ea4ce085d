//! What holds for every text, number and header, and tables of cells and headers that read as documentation.

mod beside;
mod cells;
mod columns;
mod doubtful_columns;
mod header_rows;
mod identity;
mod quantity;
mod references;
mod sheet;
mod spellings;
mod tables;
mod thousands;
mod words;

/// The same cases in every run, so that a change is to blame for a failure; `PROPTEST_RNG_SEED` and `PROPTEST_CASES`
/// draw others.
pub(crate) fn sampling() -> proptest::test_runner::Config {
    let chosen = proptest::test_runner::Config::default();
    let rng_seed = match chosen.rng_seed {
        proptest::test_runner::RngSeed::Random => proptest::test_runner::RngSeed::Fixed(20_261_201),
        fixed @ proptest::test_runner::RngSeed::Fixed(_) => fixed,
    };
    proptest::test_runner::Config { rng_seed, failure_persistence: None, ..chosen }
}
