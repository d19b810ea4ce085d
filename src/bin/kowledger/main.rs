//! The command line of kowledger.

fn main() {}
