//! What every output says about itself.

/// The cautions of use, one sentence a line of the Run record.
pub const CAUTIONS_OF_USE: [&str; 8] = [
    "This is a screening. It is not a regulatory decision, not a classification and not a safety assessment.",
    "The current text of the law prevails over every limit shown here; the Rulebooks sheet says which text each limit follows and how it was checked.",
    "A qualified person has to confirm every verdict before anyone relies on it.",
    "`unresolved` and `no data` mean that the question is open. They are not evidence of safety, and neither is the absence of a flag.",
    "`screens out` means that screening information points away from the criterion; it does not show that the criterion is not met.",
    "The inventory is taken at its word: a value said to be measured is treated as measured, and no original study has been looked at.",
    "Estimated values carry the error of their equation; they are shown as estimated and never decide as if they were measured.",
    "Lists of named substances (candidate lists, annexes, national inventories) were consulted only where a rulebook of this run contains them.",
];
