//! How the units are spelt, in English, German, French, Spanish, Italian, Dutch, Japanese and Chinese.
//!
//! Every spelling is in the form that [`fold`](super::fold::fold) gives: lower case, without accents, spaces and
//! multiplication signs, `per` written `/`, litres `l`, cubic centimetres `ml`, and `l-1` written `/l`.

use crate::quantity::Unit;

/// Parted by spaces.
pub(super) const SPELLINGS: &[(Unit, &str)] = &[
    (
        Unit::One,
        "- none dimensionless dimensionslos unitless einheitenlos sansdimension adimensional adimensionale dimensieloos 無次元 无量纲 無因次",
    ),
    (
        Unit::Second,
        "s sec secs sek second seconds sekunde sekunden seconde secondes segundos segundo secondo secondi seconden 秒 秒間 秒钟",
    ),
    (Unit::Minute, "min mins minute minutes minuten minutos minuto minuti minuut 分 分間 分钟 分鐘"),
    (
        Unit::Hour,
        "h hr hrs hour hours std stunde stunden heure heures hora horas ora ore uur uren 時間 小时 小時 時 个小时 個小時",
    ),
    (
        Unit::Day,
        "d day days tag tage tagen jour jours dia dias giorno giorni gg dag dagen dgn 日 日間 天 日数",
    ),
    (
        Unit::Week,
        "w wk wks week weeks wo woche wochen semaine semaines sem semana semanas settimana settimane sett weken 週 週間 周 星期 个星期 個星期",
    ),
    (
        Unit::Month,
        "mo mos mon mth mths month months monat monate monaten mois mes meses mese mesi maand maanden mnd mnden か月 ヶ月 ケ月 カ月 ヵ月 箇月 か月間 ヶ月間 カ月間 月 月間 个月 個月",
    ),
    (
        Unit::Year,
        "a y yr yrs year years jahr jahre jahren an ans annee annees ano anos anno anni jaar jaren jr 年 年間 年间",
    ),
    (Unit::PicogramPerLitre, "pg/l"),
    (Unit::NanogramPerLitre, "ng/l pg/ml µg/m3"),
    (Unit::MicrogramPerLitre, "µg/l ppb ng/ml mg/m3"),
    (Unit::MilligramPerLitre, "mg/l ppm µg/ml g/m3"),
    (Unit::GramPerLitre, "g/l mg/ml kg/m3"),
    (Unit::KilogramPerLitre, "kg/l g/ml"),
    (Unit::GramPerDecilitre, "g/100ml g/dl %w/v %(w/v) %m/v %(m/v) %p/v w/v% %wt/vol"),
    (Unit::MilligramPerDecilitre, "mg/100ml mg/dl"),
    (Unit::MolePerLitre, "mol/l"),
    (Unit::MillimolePerLitre, "mmol/l mol/m3"),
    (Unit::MicromolePerLitre, "µmol/l mmol/m3"),
    (Unit::NanomolePerLitre, "nmol/l µmol/m3"),
    (Unit::LitrePerKilogram, "l/kg ml/g l/kgww l/kgwwt l/kgbw l/kgoc lww/kg"),
    (Unit::LitrePerGram, "l/g m3/kg"),
    (Unit::LogLitrePerKilogram, "logl/kg lgl/kg log(l/kg) lg(l/kg) logml/g"),
    (Unit::Pascal, "pa pascal pascals n/m2 帕 帕斯卡 パスカル"),
    (Unit::Hectopascal, "hpa mbar millibar hectopascal hektopascal 百帕 ヘクトパスカル"),
    (Unit::Kilopascal, "kpa kilopascal kilopascals 千帕 キロパスカル"),
    (Unit::Bar, "bar"),
    (Unit::MillimetreMercury, "mmhg torr mmdehg 毫米汞柱"),
    (Unit::Millitorr, "mtorr µmhg"),
    (Unit::Atmosphere, "atm 气压 大气压 標準大気圧 気圧"),
    (Unit::PoundPerSquareInch, "psi psia lb/in2 lbf/in2"),
    (Unit::Micropascal, "µpa"),
    (Unit::Megapascal, "megapascal 兆帕"),
    (Unit::Millipascal, "millipascal 毫帕"),
    (
        Unit::Celsius,
        "°c c degc deg.c °celsius celsius gradc gradcelsius degreescelsius degreec degreesc degresc degresce degrec degrescelsius gradosc gradoscelsius gradic gradicelsius gradenc gradencelsius 摄氏度 攝氏度 セ氏",
    ),
    (Unit::Kelvin, "k kelvin °k 开尔文 ケルビン"),
    (Unit::Fahrenheit, "°f f degf fahrenheit gradfahrenheit 华氏度 華氏度"),
    (Unit::GramPerMole, "g/mol da dalton daltons u amu kg/kmol"),
    (Unit::KilogramPerMole, "kg/mol kda kilodalton kilodaltons"),
    (Unit::PascalCubicMetrePerMole, "pam3/mol pa/(mol/m3) pa/mol/m3 m3pa/mol pa-m3/mol pa.m3/mol j/mol"),
    (Unit::KilopascalCubicMetrePerMole, "kpam3/mol kpa-m3/mol m3kpa/mol"),
    (Unit::AtmosphereCubicMetrePerMole, "atmm3/mol atm-m3/mol atm.m3/mol m3atm/mol m3-atm/mol"),
    (Unit::AtmosphereLitrePerMole, "atml/mol latm/mol l-atm/mol atm-l/mol"),
    (
        Unit::Percent,
        concat!(
            "% percent prozent wt% wt.% wt-% gew% gew.% gew-% gew.-% %w/w %(w/w) w/w% %m/m %(m/m) m/m% %wt %gew vol% pct ma% ma.-% ",
            "ma-% mass% masse% masse-% /cent procent percento /cento /ciento porciento pourcent %p/p %(p/p) %peso %enpeso %inpeso ",
            "%enpoids %poids %massique %pds %mass massa% massa-% gew.procent パーセント 質量% 质量% 重量% 質量パーセント g/100g"
        ),
    ),
    (Unit::GramPerKilogram, "g/kg ‰ promille permille /mille pourmille /mil mg/g"),
    (Unit::MilligramPerKilogram, "mg/kg ppmw µg/g ppmw/w ppm(w/w)"),
    (Unit::MicrogramPerKilogram, "µg/kg ppbw ng/g"),
    (Unit::TonnePerYear, "t/a t tpa tpy tp.a mt/a"),
    (Unit::KilogramPerYear, "kg/a kg kgp.a"),
    (Unit::KilotonnePerYear, "kt/a kt ktpa"),
    (Unit::KilojoulePerMole, "kj/mol"),
];

/// Spellings that name a unit only where this dimension is asked for, because they name another or none elsewhere.
pub(super) const IN_DIMENSION: &[(Unit, &str)] = &[
    (Unit::MilligramPerKilogram, "ppm"),
    (Unit::MicrogramPerKilogram, "ppb"),
    (Unit::Hour, "u"),
    (Unit::Day, "g"),
    (Unit::Celsius, "度"),
];

/// Spellings whose case tells them apart; without regard to case they name nothing.
pub(super) const EXACT: &[(Unit, &str)] = &[
    (Unit::MolePerLitre, "M"),
    (Unit::MillimolePerLitre, "mM"),
    (Unit::MicromolePerLitre, "µM uM"),
    (Unit::NanomolePerLitre, "nM"),
    (Unit::Millipascal, "mPa"),
    (Unit::Megapascal, "MPa"),
    (Unit::Year, "J J."),
    (Unit::Jour, "j j."),
];
