//! The chance that a value lies beyond a limit, given its error, in log units.
//!
//! It is a statement about the value and its error, not about the substance.

/// The standard normal distribution function.
pub fn normal_cumulative(z: f64) -> f64 {
    0.5 * libm::erfc(-z / std::f64::consts::SQRT_2)
}

/// The chance that a value with normal error `sd` lies above `limit`; all three in log units.
///
/// P = 1 - Phi((limit - value) / sd). A value without error lies above or it does not.
pub fn chance_beyond(value: f64, sd: f64, limit: f64) -> f64 {
    if sd <= 0.0 {
        return if value > limit { 1.0 } else { 0.0 };
    }
    1.0 - normal_cumulative((limit - value) / sd)
}

#[cfg(test)]
mod tests {
    use super::chance_beyond;

    #[test]
    fn at_the_limit_the_chance_is_one_half_and_one_sd_above_it_is_as_tables_say() {
        assert!((chance_beyond(4.5, 0.3, 4.5) - 0.5).abs() < 1e-12);
        // Standard normal table: Phi(1) = 0.84134.
        assert!((chance_beyond(4.8, 0.3, 4.5) - 0.841_34).abs() < 1e-5);
    }
}
