//! Whether a molecular formula, as a cell writes it, is of an inorganic substance.
//!
//! A mistake towards `inorganic` would put an organic substance outside a rulebook, so that only formulas without
//! doubt count: every symbol must be an element, and short words of capitals (`NO`, `NS`) are not taken for formulas.

use std::collections::BTreeMap;

/// Elements up to uranium. Later ones are left out: `No` in a cell is a word, not nobelium.
const ELEMENTS: &str = " H He Li Be B C N O F Ne Na Mg Al Si P S Cl Ar K Ca Sc Ti V Cr Mn Fe Co Ni Cu Zn Ga Ge As Se Br \
    Kr Rb Sr Y Zr Nb Mo Tc Ru Rh Pd Ag Cd In Sn Sb Te I Xe Cs Ba La Ce Pr Nd Pm Sm Eu Gd Tb Dy Ho Er Tm Yb Lu Hf Ta W \
    Re Os Ir Pt Au Hg Tl Pb Bi Po At Rn Fr Ra Ac Th Pa U ";

/// Elements that make no carbonate, cyanide or carbide ionic.
const NOT_METALS: &str = " H He B C N O F Ne Si P S Cl Ar As Se Br Kr Te I Xe At Rn ";

/// Formulas in capitals alone that are substances and no words.
const CAPITALS: [&str; 15] =
    ["HF", "KF", "FK", "KI", "IK", "HI", "KH", "KOH", "HKO", "KCN", "CKN", "HCN", "CHN", "CKNS", "KSCN"];

/// A symbol and the number written behind it.
type Atom<'formula> = (&'formula str, u32);

/// No carbon, or a carbonate, hydrogencarbonate, cyanide, cyanate, thiocyanate, carbide or oxide of carbon.
pub(super) fn is_inorganic(formula: &str) -> bool {
    let formula = in_plain_letters(formula);
    if is_perhaps_a_word(&formula) {
        return false;
    }
    let Some(atoms) = read_atoms(&formula) else {
        return false;
    };
    let mut counts: BTreeMap<&str, u32> = BTreeMap::new();
    for (symbol, count) in &atoms {
        let sum = counts.entry(symbol).or_default();
        *sum = sum.saturating_add(*count);
    }
    let count = |symbol: &str| counts.get(symbol).copied().unwrap_or(0);
    let has_metal = counts.keys().any(|symbol| !is_in(NOT_METALS, symbol));
    let only =
        |allowed: &[&str]| counts.keys().all(|symbol| allowed.contains(symbol) || !is_in(NOT_METALS, symbol));
    let (carbon, hydrogen, nitrogen, oxygen) = (count("C"), count("H"), count("N"), count("O"));
    if carbon == 0 {
        return !atoms.is_empty();
    }
    let oxide = atoms.as_slice() == [("C", 1), ("O", 1)] || atoms.as_slice() == [("C", 1), ("O", 2)];
    let hydrogen_cyanide = counts.len() == 3 && carbon == 1 && hydrogen == 1 && nitrogen == 1;
    let carbide = carbon > 0 && counts.len() > 1 && only(&["C", "Si", "B"]);
    // Hydrogen only as in hydrogencarbonates: a sum formula of more could be a hydrate of a formate or oxalate.
    let carbonate =
        has_metal && only(&["C", "H", "O"]) && oxygen == carbon.saturating_mul(3) && hydrogen <= carbon;
    let anions = [0, carbon];
    let cyanide = has_metal
        && only(&["C", "N", "O", "S"])
        && nitrogen == carbon
        && anions.contains(&oxygen)
        && anions.contains(&count("S"));
    oxide || hydrogen_cyanide || carbide || carbonate || cyanide || (has_metal && holds_only_anions(&atoms))
}

/// A formula that can be read, holds carbon and is no inorganic one.
pub(super) fn holds_organic_carbon(formula: &str) -> bool {
    let plain = in_plain_letters(formula);
    let holds_carbon = read_atoms(&plain).is_some_and(|atoms| atoms.iter().any(|(symbol, _)| *symbol == "C"));
    holds_carbon && !is_perhaps_a_word(&plain) && !is_inorganic(formula)
}

/// Written by groups, as in `Cu2(OH)2CO3` or `K4[Fe(CN)6]`: every carbon is followed by three oxygens or a nitrogen.
fn holds_only_anions(atoms: &[Atom<'_>]) -> bool {
    atoms.iter().enumerate().all(|(index, atom)| match *atom {
        ("C", 1) => matches!(atoms.get(index + 1), Some(("O", 3) | ("N", 1))),
        ("C", _) => false,
        _ => true,
    })
}

/// Subscripts as digits, and the `x` or `×` before the water of a hydrate as a dot.
fn in_plain_letters(formula: &str) -> String {
    let plain = |letter: char| match u32::from(letter).checked_sub(u32::from('₀')) {
        Some(digit @ 0..=9) => char::from_digit(digit, 10).unwrap_or(letter),
        Some(_) | None => letter,
    };
    let digits: String = formula.trim().chars().map(plain).collect();
    digits.replace(" x ", "·").replace('×', "·")
}

fn is_perhaps_a_word(formula: &str) -> bool {
    let has_digit = formula.contains(|letter: char| letter.is_ascii_digit());
    let has_small = formula.contains(|letter: char| letter.is_ascii_lowercase());
    let ambiguous = ["Na", "Si", "Co"].contains(&formula);
    ambiguous || (!has_digit && !has_small && !CAPITALS.contains(&formula) && formula != "CO")
}

/// The atoms in order as written; brackets, charges' signs and the dot of a hydrate are passed over. Multipliers of
/// brackets and hydrates are not counted: only whether and beside what an element stands matters.
fn read_atoms(formula: &str) -> Option<Vec<Atom<'_>>> {
    let mut atoms = Vec::new();
    let mut rest = formula;
    while let Some(first) = rest.chars().next() {
        let length = if first.is_ascii_uppercase() {
            let symbol = symbol_at(rest)?;
            let digits = digits_at(rest.get(symbol.len()..)?);
            let count = if digits.is_empty() { 1 } else { digits.parse().ok()? };
            atoms.push((symbol, count));
            symbol.len() + digits.len()
        } else if "()[]·•.*⋅+-– ".contains(first) || first.is_ascii_digit() {
            first.len_utf8()
        } else {
            return None;
        };
        rest = rest.get(length..)?;
    }
    Some(atoms)
}

fn symbol_at(text: &str) -> Option<&str> {
    [2, 1].into_iter().filter_map(|length| text.get(..length)).find(|symbol| is_in(ELEMENTS, symbol))
}

fn digits_at(text: &str) -> &str {
    let end = text.find(|letter: char| !letter.is_ascii_digit()).unwrap_or(text.len());
    text.get(..end).unwrap_or("")
}

fn is_in(elements: &str, symbol: &str) -> bool {
    elements.split_whitespace().any(|element| element == symbol)
}

#[cfg(test)]
mod tests {
    use super::is_inorganic;

    #[test]
    fn formulas_without_carbon_and_of_carbonates_cyanides_and_carbides_are_inorganic() {
        for formula in [
            "NaCl",
            "H2SO4",
            "TiO2",
            "ZnO",
            "H2O",
            "CuSO4·5H2O",
            "CuSO4.5H2O",
            "CuSO4 x 5 H2O",
            "CaCO₃",
            "MgSO₄ × 7 H₂O",
            "Na2CO3",
            "CNa2O3",
            "CHNaO3",
            "NaHCO3",
            "CaCO3",
            "KCN",
            "NaCN",
            "CNNa",
            "HCN",
            "CHN",
            "CO2",
            "CO",
            "CaC2",
            "SiC",
            "W2C",
            "KSCN",
            "KSCN",
            "CKNS",
            "NaOCN",
            "K4[Fe(CN)6]",
            "Cu2(OH)2CO3",
            "(NH4)2SO4",
            "H4N2",
            "Ca(OH)2",
            "K3Fe(CN)6",
            "HCl",
        ] {
            assert!(is_inorganic(formula), "{formula}");
        }
    }

    #[test]
    fn organic_formulas_are_not() {
        for formula in [
            "C2H3NaO2",
            "CH3COONa",
            "C₂H₃NaO₂",
            "Mg(C2H3O2)2 x 4 H2O",
            "CHNaO2",
            "C2Na2O4",
            "Na2C2O4",
            "C2H4MgO6",
            "CCl4",
            "C2Cl4",
            "CHCl3",
            "CH4",
            "CH4N2O",
            "C8HF15O2",
            "C12H27ClSn",
            "C24H54OSn2",
            "C8H20Pb",
            "C2H6Hg",
            "C4NiO4",
            "Ni(CO)4",
            "Fe(CO)5",
            "C10H10Fe",
            "CH4N2S",
            "C3N3Cl3",
            "COCl2",
            "CS2",
            "C6Cl6",
            "CF4",
            "C8H18O3Si2",
            "[Si(CH3)2O]n",
            "(C2H4O)n",
            "C2Na2O4·H2O",
        ] {
            assert!(!is_inorganic(formula), "{formula}");
        }
    }

    #[test]
    fn words_are_no_formulas() {
        for word in [
            "", "NO", "No", "Na", "NA", "n/a", "NS", "SI", "Si", "none", "None", "unknown", "UVCB", "-",
            "OUI",
        ] {
            assert!(!is_inorganic(word), "{word}");
        }
    }
}
