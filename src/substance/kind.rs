//! What a row says it is: a substance, a mixture or an article, and which type of substance.

/// What the row describes.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub enum RowType {
    /// Not said; taken as a substance.
    #[default]
    NotStated,
    /// A substance.
    Substance,
    /// A mixture, which is screened by its components only.
    Mixture,
    /// An article.
    Article,
}

/// The type of substance a row states.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum SubstanceType {
    /// A well-defined organic substance.
    Organic,
    /// An inorganic substance.
    Inorganic,
    /// An organometallic substance.
    Organometallic,
    /// A polymer.
    Polymer,
    /// Unknown or variable composition, complex reaction product or biological material.
    Uvcb,
    /// Several main constituents.
    MultiConstituent,
    /// A mixture.
    Mixture,
    /// A surfactant.
    Surfactant,
    /// A salt of an organic ion.
    OrganicSalt,
    /// A substance with a perfluorinated or polyfluorinated chain.
    Perfluoroalkyl,
    /// An acid or base that ionises in the environment.
    Ionisable,
}

impl SubstanceType {
    /// Every type.
    pub const ALL: [Self; 11] = [
        Self::Organic,
        Self::Inorganic,
        Self::Organometallic,
        Self::Polymer,
        Self::Uvcb,
        Self::MultiConstituent,
        Self::Mixture,
        Self::Surfactant,
        Self::OrganicSalt,
        Self::Perfluoroalkyl,
        Self::Ionisable,
    ];

    /// The name in rule files.
    pub fn id(self) -> &'static str {
        match self {
            Self::Organic => "organic",
            Self::Inorganic => "inorganic",
            Self::Organometallic => "organometallic",
            Self::Polymer => "polymer",
            Self::Uvcb => "uvcb",
            Self::MultiConstituent => "multi-constituent",
            Self::Mixture => "mixture",
            Self::Surfactant => "surfactant",
            Self::OrganicSalt => "organic-salt",
            Self::Perfluoroalkyl => "perfluoroalkyl",
            Self::Ionisable => "ionisable",
        }
    }

    /// The type a rule file names.
    pub fn from_id(id: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|kind| kind.id() == id)
    }
}
