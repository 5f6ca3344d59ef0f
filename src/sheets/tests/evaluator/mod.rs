//! A pocket calculator for printed workings: reads a line as a checker would, figures, units and brackets, and computes
//! it. It shares nothing with the trace that the line came from.

/// A value in N and m with its dimension.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Value {
    pub si: f64,
    pub force: f64,
    pub length: f64,
}

impl Value {
    pub fn same_dimension(self, other: Value) -> bool {
        self.force == other.force && self.length == other.length
    }
}

#[derive(Clone, Debug, PartialEq)]
pub enum Token {
    Number(String),
    Unit(&'static str),
    Symbol(String),
    Sign(char),
    Raised(i32),
}

/// Units as printed, with what one of them is: factor, powers of force and of length.
const UNITS: [(&str, f64, f64, f64); 16] = [
    ("kNm²", 1e3, 1.0, 2.0),
    ("kNm", 1e3, 1.0, 1.0),
    ("kN/m³", 1e3, 1.0, -3.0),
    ("kN/m²", 1e3, 1.0, -2.0),
    ("kN/m", 1e3, 1.0, -1.0),
    ("kN", 1e3, 1.0, 0.0),
    ("N/mm²", 1e6, 1.0, -2.0),
    ("mm³", 1e-9, 0.0, 3.0),
    ("mm²", 1e-6, 0.0, 2.0),
    ("mm", 1e-3, 0.0, 1.0),
    ("cm⁴", 1e-8, 0.0, 4.0),
    ("cm³", 1e-6, 0.0, 3.0),
    ("cm²", 1e-4, 0.0, 2.0),
    ("dm⁶", 1e-6, 0.0, 6.0),
    ("m²", 1.0, 0.0, 2.0),
    ("m", 1.0, 0.0, 1.0),
];

pub fn tokens(text: &str) -> Vec<Token> {
    let mut tokens = Vec::new();
    let mut rest = text;
    while let Some(first) = rest.chars().next() {
        let after_number = matches!(tokens.last(), Some(Token::Number(_)));
        let whole = |name: &str| {
            let after = rest.strip_prefix(name);
            after.is_some_and(|after| !after.starts_with(|c: char| c.is_alphanumeric() || c == '_'))
        };
        let unit = UNITS.iter().find(|(name, ..)| after_number && whole(name));
        if let Some((name, ..)) = unit {
            tokens.push(Token::Unit(name));
            rest = &rest[name.len()..];
        } else if first == ' ' {
            rest = &rest[1..];
        } else if first.is_ascii_digit() {
            let end = rest.find(|c: char| !c.is_ascii_digit() && c != '.').unwrap_or(rest.len());
            tokens.push(Token::Number(rest[..end].into()));
            rest = &rest[end..];
        } else if let Some((power, length)) = raised(rest) {
            tokens.push(Token::Raised(power));
            rest = &rest[length..];
        } else if "+\u{2212}×/(),√".contains(first) {
            tokens.push(Token::Sign(first));
            rest = &rest[first.len_utf8()..];
        } else {
            // A symbol runs to the next space, bracket or raised digit; a comma inside is followed by no space.
            let end = rest
                .char_indices()
                .find(|(at, c)| {
                    " ()".contains(*c) || raised(&rest[*at..]).is_some() || rest[*at..].starts_with(", ")
                })
                .map_or(rest.len(), |(at, _)| at);
            tokens.push(Token::Symbol(rest[..end].into()));
            rest = &rest[end..];
        }
    }
    tokens
}

fn raised(text: &str) -> Option<(i32, usize)> {
    const DIGITS: &str = "⁰¹²³⁴⁵⁶⁷⁸⁹";
    let (negative, digits) = match text.strip_prefix('⁻') {
        Some(digits) => (true, digits),
        None => (false, text),
    };
    let mut power = 0;
    let mut length = text.len() - digits.len();
    let mut any = false;
    for c in digits.chars() {
        let Some(digit) = DIGITS.chars().position(|d| d == c) else { break };
        power = power * 10 + digit as i32;
        length += c.len_utf8();
        any = true;
    }
    any.then_some((if negative { -power } else { power }, length))
}

/// Computes a printed formula; panics, as a test may, where it cannot be read or its units do not meet.
pub fn evaluate(text: &str) -> Value {
    evaluate_with(text, &|symbol| panic!("no value for {symbol} in {text}"))
}

pub fn evaluate_with(text: &str, symbols: &dyn Fn(&str) -> Value) -> Value {
    let mut reader = Reader { tokens: tokens(text), at: 0, symbols, text };
    let value = reader.sum();
    assert_eq!(reader.at, reader.tokens.len(), "unread: {text}");
    value
}

struct Reader<'a> {
    tokens: Vec<Token>,
    at: usize,
    symbols: &'a dyn Fn(&str) -> Value,
    text: &'a str,
}

impl Reader<'_> {
    fn next_is(&mut self, sign: char) -> bool {
        let found = self.tokens.get(self.at) == Some(&Token::Sign(sign));
        self.at += usize::from(found);
        found
    }

    fn sum(&mut self) -> Value {
        let minus = self.next_is('\u{2212}');
        let mut sum = self.product();
        if minus {
            sum.si = -sum.si;
        }
        loop {
            let sign = if self.next_is('+') {
                1.0
            } else if self.next_is('\u{2212}') {
                -1.0
            } else {
                return sum;
            };
            let next = self.product();
            self.meet(sum, next);
            sum.si += sign * next.si;
        }
    }

    fn meet(&self, one: Value, other: Value) {
        assert!(one.same_dimension(other), "{one:?} meets {other:?} in {}", self.text);
    }

    fn product(&mut self) -> Value {
        let mut product = self.power();
        loop {
            let divide = if self.next_is('/') {
                true
            } else {
                let times = self.next_is('×');
                let side_by_side = match self.tokens.get(self.at) {
                    Some(Token::Symbol(_) | Token::Number(_)) => true,
                    Some(Token::Sign(sign)) => matches!(sign, '(' | '√'),
                    _ => false,
                };
                if !times && !side_by_side {
                    return product;
                }
                false
            };
            let next = self.power();
            let sign = if divide { -1.0 } else { 1.0 };
            product.si = if divide { product.si / next.si } else { product.si * next.si };
            product.force += sign * next.force;
            product.length += sign * next.length;
        }
    }

    fn power(&mut self) -> Value {
        let mut base = self.whole();
        if let Some(Token::Raised(power)) = self.tokens.get(self.at) {
            let power = *power;
            self.at += 1;
            base = raise(base, f64::from(power));
        }
        base
    }

    fn whole(&mut self) -> Value {
        let token = self.tokens.get(self.at).unwrap_or_else(|| panic!("ends early: {}", self.text)).clone();
        self.at += 1;
        match token {
            Token::Number(digits) => {
                let si: f64 = digits.parse().unwrap_or_else(|_| panic!("{digits} in {}", self.text));
                if let Some(Token::Unit(unit)) = self.tokens.get(self.at) {
                    self.at += 1;
                    return measured(si, unit);
                }
                Value { si, force: 0.0, length: 0.0 }
            }
            Token::Symbol(name) if name == "min" || name == "max" => {
                assert!(self.next_is('('));
                let mut best = self.sum();
                while self.next_is(',') {
                    let next = self.sum();
                    self.meet(best, next);
                    best.si = if name == "min" { best.si.min(next.si) } else { best.si.max(next.si) };
                }
                assert!(self.next_is(')'));
                best
            }
            Token::Symbol(name) => (self.symbols)(&name),
            Token::Sign('√') => raise(self.whole(), 0.5),
            Token::Sign('(') => {
                let inner = self.sum();
                assert!(self.next_is(')'), "bracket left open: {}", self.text);
                inner
            }
            other => panic!("{other:?} in {}", self.text),
        }
    }
}

fn raise(base: Value, power: f64) -> Value {
    Value { si: base.si.powf(power), force: base.force * power, length: base.length * power }
}

/// So many of a unit.
pub fn measured(number: f64, unit: &str) -> Value {
    if unit.is_empty() {
        return Value { si: number, force: 0.0, length: 0.0 };
    }
    let found = UNITS.iter().find(|(name, ..)| *name == unit);
    let (_, one, force, length) = found.unwrap_or_else(|| panic!("no unit {unit}"));
    Value { si: number * one, force: *force, length: *length }
}

/// A printed number and one unit of its last figure.
pub fn printed(text: &str) -> (f64, f64) {
    let (negative, digits) = match text.strip_prefix('\u{2212}') {
        Some(digits) => (true, digits),
        None => (false, text),
    };
    let value: f64 = digits.parse().unwrap_or_else(|_| panic!("{text}"));
    let last = match digits.split_once('.') {
        Some((_, places)) => 10f64.powi(-(places.len() as i32)),
        None => 10f64.powi(digits.bytes().rev().take_while(|b| *b == b'0').count() as i32),
    };
    (if negative { -value } else { value }, last)
}
