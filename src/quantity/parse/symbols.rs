//! Single characters and escapes that stand for others: squares of several letters, signs of other scripts, `&lt;`.

use std::borrow::Cow;

/// What bad exports leave of signs, and the signs. `&amp;` first, for texts escaped twice.
const ENTITIES: &[(&str, &str)] = &[
    ("&amp;", "&"),
    ("&lt;", "<"),
    ("&gt;", ">"),
    ("&le;", "≤"),
    ("&ge;", "≥"),
    ("&nbsp;", " "),
    ("&thinsp;", " "),
    ("&deg;", "°"),
    ("&micro;", "µ"),
    ("&mu;", "µ"),
    ("&plusmn;", "±"),
    ("&times;", "×"),
    ("&middot;", "·"),
    ("&minus;", "-"),
    ("&ndash;", "-"),
    ("&mdash;", "-"),
    ("&sup2;", "²"),
    ("&sup3;", "³"),
    ("&quot;", "\""),
    ("&apos;", "'"),
    ("&#39;", "'"),
    ("&#60;", "<"),
    ("&#62;", ">"),
    ("&#160;", " "),
    ("&#176;", "°"),
    ("&#177;", "±"),
    ("&#181;", "µ"),
    ("&#956;", "µ"),
    ("&#8804;", "≤"),
    ("&#8805;", "≥"),
];

/// A text with the escapes of web pages read as the signs they stand for.
pub(super) fn entities_read(text: &str) -> Cow<'_, str> {
    let mut read = Cow::Borrowed(text);
    for (entity, sign) in ENTITIES {
        if read.contains(entity) {
            read = Cow::Owned(read.replace(entity, sign));
        }
    }
    read
}

/// What a single character stands for, where that is not itself.
pub(super) fn symbol(character: char) -> Option<&'static str> {
    Some(match character {
        '\u{3BC}' => "µ",
        '\u{2103}' => "°C",
        '\u{2109}' => "°F",
        '\u{212A}' => "K",
        'º' | '˚' => "°",
        '½' => "1/2",
        '¼' => "1/4",
        '¾' => "3/4",
        '⁄' | '∕' => "/",
        '≧' | '⩾' | '≮' | '≳' => "≥",
        '≦' | '⩽' | '≯' | '≲' => "≤",
        '‹' | '≪' => "<",
        '›' | '≫' => ">",
        '∼' | '〜' | '≈' | '≅' | '≃' | '≒' | '≑' | '∽' => "~",
        '’' | '‘' | '´' | '`' | 'ʼ' => "'",
        '…' | '‥' => "...",
        '、' | '､' => ", ",
        '。' | '｡' => ".",
        '【' | '「' | '『' | '〔' | '｢' => "(",
        '】' | '」' | '』' | '〕' | '｣' => ")",
        '㎎' => "mg",
        '㎍' => "µg",
        '㎏' => "kg",
        '㎖' => "ml",
        '㎕' => "µl",
        '㎗' => "dl",
        'ℓ' | '㍑' => "l",
        '㎤' => "cm3",
        '㎥' => "m3",
        '㏄' => "cc",
        '㎩' => "Pa",
        '㎪' => "kPa",
        '㎫' => "MPa",
        '㍱' => "hPa",
        '㍴' => "bar",
        '㏖' => "mol",
        '㏗' => "pH",
        '㏙' => "ppm",
        '﹪' | '㌫' => "%",
        '㌘' => "g",
        '㌧' => "t",
        _ => return None,
    })
}
