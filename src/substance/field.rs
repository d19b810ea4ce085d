//! What a column may hold.

use crate::quantity::Unit;
use crate::substance::Property;

/// The meaning of a column.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Field {
    /// The user's own number of the row or material.
    RowId,
    /// Substance, mixture or article.
    RowType,
    /// Name of the substance.
    Name,
    /// CAS Registry Number.
    CasNumber,
    /// EC number.
    EcNumber,
    /// SMILES.
    Smiles,
    /// InChI key.
    InchiKey,
    /// Molecular formula.
    Formula,
    /// Substance type: organic, inorganic, polymer, UVCB, ...
    SubstanceType,
    /// A numeric property.
    Property(Property),
    /// How the log Kow was obtained.
    LogKowMethod,
    /// Standard deviation of the log Kow.
    LogKowSd,
    /// Temperature of the log Kow.
    LogKowTemperature,
    /// pH of the log Kow.
    LogKowPh,
    /// pH of the Koc.
    KocPh,
    /// Lipid content of the fish of the BCF.
    BcfLipid,
    /// Test temperature of the half-lives of the row.
    HalfLifeTemperature,
    /// Ready biodegradability.
    ReadyBiodegradability,
    /// Inherent biodegradability.
    InherentBiodegradability,
    /// Hazard statements.
    HazardStatements,
    /// Reliability score 1 to 4.
    Reliability,
    /// Test guideline.
    Guideline,
    /// Reference.
    Reference,
    /// Year of the reference.
    Year,
    /// Product.
    Product,
    /// Supplier.
    Supplier,
    /// Content, % w/w.
    Content,
    /// Tonnes per year.
    Tonnage,
    /// Use.
    Use,
    /// The substance this one would replace.
    SubstituteFor,
    /// The parent of which this is a constituent.
    ConstituentOf,
    /// What this substance transforms to.
    TransformsTo,
    /// The assessor's verdict.
    AssessorVerdict,
    /// The assessor's reason.
    AssessorReason,
    /// The assessor's name.
    Assessor,
    /// The day of the assessment.
    AssessedOn,
    /// The unit of the values in another column.
    UnitOfValue,
    /// The sign before the values in another column: `>`, `<`, `ca.`.
    QualifierOfValue,
}

impl Field {
    /// The fields that hold no numeric property.
    const OTHERS: [Self; 37] = [
        Self::RowId,
        Self::RowType,
        Self::Name,
        Self::CasNumber,
        Self::EcNumber,
        Self::Smiles,
        Self::InchiKey,
        Self::Formula,
        Self::SubstanceType,
        Self::LogKowMethod,
        Self::LogKowSd,
        Self::LogKowTemperature,
        Self::LogKowPh,
        Self::KocPh,
        Self::BcfLipid,
        Self::HalfLifeTemperature,
        Self::ReadyBiodegradability,
        Self::InherentBiodegradability,
        Self::HazardStatements,
        Self::Reliability,
        Self::Guideline,
        Self::Reference,
        Self::Year,
        Self::Product,
        Self::Supplier,
        Self::Content,
        Self::Tonnage,
        Self::Use,
        Self::SubstituteFor,
        Self::ConstituentOf,
        Self::TransformsTo,
        Self::AssessorVerdict,
        Self::AssessorReason,
        Self::Assessor,
        Self::AssessedOn,
        Self::UnitOfValue,
        Self::QualifierOfValue,
    ];

    /// Every field.
    pub fn all() -> impl Iterator<Item = Self> {
        Self::OTHERS.into_iter().chain(Property::ALL.into_iter().map(Self::Property))
    }

    /// The name in `rules/columns.toml` and in `--column 'Header=field'`.
    pub fn id(self) -> &'static str {
        match self {
            Self::RowId => "row-id",
            Self::RowType => "row-type",
            Self::Name => "name",
            Self::CasNumber => "cas-number",
            Self::EcNumber => "ec-number",
            Self::Smiles => "smiles",
            Self::InchiKey => "inchi-key",
            Self::Formula => "formula",
            Self::SubstanceType => "substance-type",
            Self::Property(property) => property.id(),
            Self::LogKowMethod => "log-kow-method",
            Self::LogKowSd => "log-kow-sd",
            Self::LogKowTemperature => "log-kow-temperature",
            Self::LogKowPh => "log-kow-ph",
            Self::KocPh => "koc-ph",
            Self::BcfLipid => "bcf-lipid",
            Self::HalfLifeTemperature => "half-life-temperature",
            Self::ReadyBiodegradability => "ready-biodegradability",
            Self::InherentBiodegradability => "inherent-biodegradability",
            Self::HazardStatements => "hazard-statements",
            Self::Reliability => "reliability",
            Self::Guideline => "guideline",
            Self::Reference => "reference",
            Self::Year => "year",
            Self::Product => "product",
            Self::Supplier => "supplier",
            Self::Content => "content",
            Self::Tonnage => "tonnes-per-year",
            Self::Use => "use",
            Self::SubstituteFor => "substitute-for",
            Self::ConstituentOf => "constituent-of",
            Self::TransformsTo => "transforms-to",
            Self::AssessorVerdict => "assessor-verdict",
            Self::AssessorReason => "assessor-reason",
            Self::Assessor => "assessor",
            Self::AssessedOn => "assessed-on",
            Self::UnitOfValue => "unit-of-value",
            Self::QualifierOfValue => "qualifier-of-value",
        }
    }

    /// The field a rule file or `--column` names.
    pub fn from_id(id: &str) -> Option<Self> {
        Self::all().find(|field| field.id() == id)
    }

    /// The unit assumed where neither cell nor header names one, for fields that hold numbers.
    pub fn default_unit(self) -> Option<Unit> {
        const OF_OTHERS: [(Field, Unit); 5] = [
            (Field::BcfLipid, Unit::Percent),
            (Field::Content, Unit::Percent),
            (Field::LogKowTemperature, Unit::Celsius),
            (Field::HalfLifeTemperature, Unit::Celsius),
            (Field::Tonnage, Unit::TonnePerYear),
        ];
        let of_others = OF_OTHERS.into_iter().find(|(field, _)| *field == self);
        self.property().map(Property::default_unit).or(of_others.map(|(_, unit)| unit))
    }

    /// The numeric property the column holds, if it holds one.
    pub fn property(self) -> Option<Property> {
        if let Self::Property(property) = self { Some(property) } else { None }
    }

    /// Whether the column alone makes a sheet an inventory.
    pub fn identifies(self) -> bool {
        matches!(self, Self::CasNumber | Self::EcNumber | Self::Smiles | Self::InchiKey)
    }
}

#[cfg(test)]
mod tests {
    use super::Field;
    use std::collections::BTreeSet;

    #[test]
    fn every_field_is_found_by_its_name() {
        let ids: BTreeSet<_> = Field::all().map(Field::id).collect();
        assert_eq!(ids.len(), Field::all().count());
        assert!(Field::all().all(|field| Field::from_id(field.id()) == Some(field)));
    }
}
