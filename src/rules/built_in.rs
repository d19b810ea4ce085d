//! The rule files that are part of the program.

pub(super) const BUILT_IN: [(&str, &str); 4] = [
    ("eu-reach-pbt", include_str!("../../rules/rulebooks/eu-reach-pbt.toml")),
    ("eu-clp-pbt-pmt", include_str!("../../rules/rulebooks/eu-clp-pbt-pmt.toml")),
    ("un-stockholm-annex-d", include_str!("../../rules/rulebooks/un-stockholm-annex-d.toml")),
    (
        "ca-persistence-bioaccumulation",
        include_str!("../../rules/rulebooks/ca-persistence-bioaccumulation.toml"),
    ),
];
pub(super) const CAUTIONS: &str = include_str!("../../rules/cautions.toml");
pub(super) const RELATIONS: &str = include_str!("../../rules/relations.toml");

/// Id and text of every built-in rulebook, in the order of their columns.
pub fn built_in_rulebooks() -> Vec<(&'static str, &'static str)> {
    BUILT_IN.to_vec()
}

/// Name and text of the other built-in rule files of this module: cautions and relations.
pub fn built_in_rule_files() -> Vec<(&'static str, &'static str)> {
    vec![("cautions.toml", CAUTIONS), ("relations.toml", RELATIONS)]
}
