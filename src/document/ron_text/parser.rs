//! From words to a tree of values, going on after every fault.

use super::lexer::{Lexer, Token, Word};
use super::syntax::SyntaxFault;
use super::tree::{Field, Node, Record, Span, Value, shortened};
use std::collections::VecDeque;

/// The deepest permitted nesting of brackets; our files need five.
const DEEPEST: usize = 32;

/// What became of a text.
#[derive(Debug)]
pub struct Parsed {
    /// The value; none when the text holds nothing at all.
    pub root: Option<Node>,
    /// What is wrong with its form, with byte offsets, in the order of the text.
    pub faults: Vec<(usize, SyntaxFault)>,
    /// The comments before the value, as written; empty if there are none.
    pub header: String,
    /// How many comments stand elsewhere.
    pub inner_comments: usize,
}

/// Reads a text; `wanted` is the name of the outermost struct, for messages.
#[must_use]
pub fn parse(text: &str, wanted: &'static str) -> Parsed {
    let mut parser =
        Parser { lexer: Lexer::new(text), ahead: VecDeque::new(), open: Vec::new(), last_end: 0, long_text: None };
    let header_end = parser.here();
    let header_comments = parser.lexer.comments;
    let header = text[..header_end].trim_start_matches('\u{feff}').trim();
    let header = if header_comments > 0 { header.replace("\r\n", "\n") } else { String::new() };
    let root = if *parser.peek() == Word::End {
        if parser.lexer.faults.found.is_empty() {
            parser.lexer.faults.push(0, SyntaxFault::Empty { wanted });
        }
        None
    } else {
        let root = parser.value();
        if *parser.peek() != Word::End {
            parser.unexpected("nothing more after the last bracket", None);
        }
        // Faults further on are worth a line too.
        while parser.take().word != Word::End {}
        Some(root)
    };
    let mut faults = parser.lexer.faults.found;
    faults.sort_by_key(|(offset, _)| *offset);
    Parsed { root, faults, header, inner_comments: parser.lexer.comments - header_comments }
}

struct Parser<'t> {
    lexer: Lexer<'t>,
    /// Words looked at but not taken.
    ahead: VecDeque<Token>,
    /// The brackets that are open now.
    open: Vec<char>,
    last_end: usize,
    /// The last string that ran over a line end: where a quote is missing, one begins there.
    long_text: Option<usize>,
}

impl Parser<'_> {
    fn look(&mut self, distance: usize) -> &Word {
        while self.ahead.len() <= distance {
            let token = self.lexer.next();
            self.ahead.push_back(token);
        }
        &self.ahead[distance].word
    }

    fn peek(&mut self) -> &Word {
        self.look(0)
    }

    /// Where the next word begins.
    fn here(&mut self) -> usize {
        self.look(0);
        self.ahead[0].span.start
    }

    fn take(&mut self) -> Token {
        let token = self.ahead.pop_front().unwrap_or_else(|| self.lexer.next());
        if token.word != Word::End {
            self.last_end = token.span.end;
        }
        token
    }

    fn fault(&mut self, offset: usize, fault: SyntaxFault) {
        self.lexer.faults.push(offset, fault);
    }

    /// Reports the next word unless it was reported as it was read.
    fn unexpected(&mut self, wanted: &'static str, remedy: Option<&str>) {
        let word = self.peek().clone();
        if word == Word::Faulty {
            return;
        }
        let offset = self.here();
        let remedy = self.missing_quote().or_else(|| remedy.map(str::to_owned));
        self.fault(offset, SyntaxFault::Unexpected { found: described(&word), wanted, remedy });
    }

    fn missing_quote(&mut self) -> Option<String> {
        let offset = self.long_text.take()?;
        let (line, _) = super::Lines::new(self.lexer.text).line_and_column(offset);
        Some(format!("perhaps the text that begins in line {line} lacks its closing quote"))
    }

    fn value(&mut self) -> Node {
        match self.peek() {
            Word::Open('(') => self.group(None),
            Word::Open('[') => self.list(),
            Word::Open(_) => {
                self.unexpected("a value", Some("write groups with round brackets and lists with square ones"));
                self.broken_group()
            }
            Word::Name(_) => {
                let token = self.take();
                self.value_from_name(token)
            }
            Word::Comma | Word::Close(_) | Word::End => {
                self.unexpected("a value", None);
                let at = self.here();
                Node { span: Span { start: at, end: at }, value: Value::Broken }
            }
            Word::Colon => {
                self.unexpected("a value", None);
                let span = self.take().span;
                Node { span, value: Value::Broken }
            }
            Word::Number(_) | Word::Text(_) | Word::Faulty => {
                let token = self.take();
                let value = match token.word {
                    Word::Number(number) => Value::Number(number),
                    Word::Text(text) => {
                        let written = token.span.start..token.span.end;
                        if self.lexer.text[written].contains('\n') {
                            self.long_text = Some(token.span.start);
                        }
                        Value::Text(text)
                    }
                    _ => Value::Broken,
                };
                Node { span: token.span, value }
            }
        }
    }

    /// A value whose first word, a name, was taken already.
    fn value_from_name(&mut self, token: Token) -> Node {
        let Word::Name(name) = token.word else {
            return Node { span: token.span, value: Value::Broken };
        };
        if *self.peek() == Word::Open('(') {
            return self.group(Some((name, token.span.start)));
        }
        let value = match name.as_str() {
            "true" => Value::Truth(true),
            "false" => Value::Truth(false),
            _ => Value::Name(name),
        };
        Node { span: token.span, value }
    }

    /// `(…)`: a struct if keys stand in it, a tuple if only values do.
    fn group(&mut self, name: Option<(String, usize)>) -> Node {
        let opening = self.here();
        if self.open.len() >= DEEPEST {
            self.fault(opening, SyntaxFault::TooDeep { most: DEEPEST });
            return self.broken_group();
        }
        self.take();
        self.open.push('(');
        let mut group = Group { fields: Vec::new(), items: Vec::new(), damaged: false };
        while self.goes_on(')', opening, &mut group.damaged) {
            self.group_member(&mut group);
            self.separator(&mut group.damaged, !group.fields.is_empty());
        }
        self.open.pop();
        let (name, start) = name.map_or((None, opening), |(name, start)| (Some(name), start));
        let span = Span { start, end: self.last_end };
        let value = if group.items.is_empty() || !group.fields.is_empty() {
            Value::Record(Record { name, fields: group.fields, damaged: group.damaged })
        } else {
            Value::Tuple { name, items: group.items }
        };
        Node { span, value }
    }

    fn group_member(&mut self, group: &mut Group) {
        let is_struct = !group.fields.is_empty();
        let begins_with_name = matches!(self.peek(), Word::Name(_));
        let has_key = begins_with_name
            && match self.look(1) {
                Word::Colon | Word::Number(_) | Word::Text(_) | Word::Name(_) | Word::Open('[') => true,
                Word::Open(_) => is_struct,
                _ => false,
            };
        if has_key {
            self.field(group);
        } else if is_struct {
            if begins_with_name {
                // The key is there, only its value is not: it is not to be called missing.
                group.damaged = true;
                self.take();
                self.unexpected("a colon and a value after the key", None);
            } else {
                let remedy = matches!(self.peek(), Word::Number(_)).then_some("write decimals with a point");
                self.unexpected("a key and a colon", remedy);
            }
            group.damaged |= self.skip_member();
        } else {
            let item = self.value();
            group.items.push(item);
        }
    }

    fn field(&mut self, group: &mut Group) {
        let token = self.take();
        if *self.peek() == Word::Colon {
            self.take();
        } else {
            self.unexpected("a colon after the key", None);
        }
        if group.fields.is_empty() && !group.items.is_empty() {
            let found = "a value without a key before this key".to_owned();
            let wanted = "key: value everywhere in one group";
            self.fault(token.span.start, SyntaxFault::Unexpected { found, wanted, remedy: None });
            group.damaged = true;
        }
        let value = self.value();
        if let Word::Name(key) = token.word {
            group.fields.push(Field { key, key_span: token.span, value });
        }
    }

    fn list(&mut self) -> Node {
        let opening = self.here();
        if self.open.len() >= DEEPEST {
            self.fault(opening, SyntaxFault::TooDeep { most: DEEPEST });
            return self.broken_group();
        }
        self.take();
        self.open.push('[');
        let mut items = Vec::new();
        let mut damaged = false;
        while self.goes_on(']', opening, &mut damaged) {
            items.push(self.value());
            self.separator(&mut damaged, false);
        }
        self.open.pop();
        if damaged {
            items.push(Node { span: Span { start: self.last_end, end: self.last_end }, value: Value::Broken });
        }
        Node { span: Span { start: opening, end: self.last_end }, value: Value::List(items) }
    }

    /// Whether one more member begins here; passes over the closing bracket and reports a missing one.
    fn goes_on(&mut self, closing: char, opening: usize, damaged: &mut bool) -> bool {
        loop {
            let word = self.peek().clone();
            match word {
                Word::Close(found) if found == closing => {
                    self.take();
                    return false;
                }
                Word::Close(found) if !self.open.contains(&opposite(found)) => {
                    self.unexpected("a bracket that was opened", None);
                    self.take();
                    *damaged = true;
                }
                Word::Close(_) | Word::End => {
                    *damaged = true;
                    // An unclosed string or a full list of faults says enough about the end of the text.
                    let said = self.lexer.faults.full
                        || self.lexer.faults.found.iter().any(|(_, fault)| {
                            matches!(fault, SyntaxFault::UnclosedText | SyntaxFault::UnclosedComment)
                        });
                    if !said {
                        self.fault(opening, SyntaxFault::UnclosedBracket { bracket: opposite(closing), closing });
                    }
                    return false;
                }
                Word::Comma => {
                    self.unexpected("one comma between two members", Some("remove it"));
                    self.take();
                }
                _ => return true,
            }
        }
    }

    /// Takes the comma after a member; reports and mends what stands there instead.
    fn separator(&mut self, damaged: &mut bool, in_struct: bool) {
        let word = self.peek().clone();
        match word {
            Word::Comma => {
                self.take();
                return;
            }
            Word::Close(_) | Word::End => return,
            Word::Name(_) if in_struct && *self.look(1) == Word::Colon => {
                self.unexpected("a comma before the next key", None);
                return;
            }
            Word::Name(_) if in_struct => {
                self.unexpected("a comma", Some("write a bare value: the unit is part of the key"));
            }
            Word::Faulty => {}
            _ if in_struct => self.unexpected("a comma", None),
            _ => {
                self.unexpected("a comma before the next value", None);
                return;
            }
        }
        *damaged |= self.skip_member();
        if *self.peek() == Word::Comma {
            self.take();
        }
    }

    /// Passes over words up to the comma or bracket that ends the present member; tells whether a key may be lost.
    fn skip_member(&mut self) -> bool {
        let mut depth = 0_usize;
        let mut lost_key = false;
        loop {
            match *self.peek() {
                Word::End => return true,
                Word::Comma | Word::Close(_) if depth == 0 => return lost_key,
                Word::Colon | Word::Faulty => lost_key = true,
                Word::Open(_) => depth += 1,
                Word::Close(_) => depth -= 1,
                _ => {}
            }
            self.take();
        }
    }

    /// Passes over a group that is not read, brackets and all.
    fn broken_group(&mut self) -> Node {
        let start = self.here();
        let mut depth = 0_usize;
        loop {
            match *self.peek() {
                Word::End => break,
                Word::Open(_) => depth += 1,
                Word::Close(_) => depth -= 1,
                _ => {}
            }
            self.take();
            if depth == 0 {
                break;
            }
        }
        Node { span: Span { start, end: self.last_end.max(start) }, value: Value::Broken }
    }
}

struct Group {
    fields: Vec<Field>,
    items: Vec<Node>,
    damaged: bool,
}

fn opposite(bracket: char) -> char {
    match bracket {
        '(' => ')',
        ')' => '(',
        '[' => ']',
        ']' => '[',
        '{' => '}',
        _ => '{',
    }
}

fn described(word: &Word) -> String {
    match word {
        Word::Open(bracket) | Word::Close(bracket) => format!("\"{bracket}\""),
        Word::Comma => "a comma".to_owned(),
        Word::Colon => "a colon".to_owned(),
        Word::Name(name) => shortened(name),
        Word::Number(number) => super::number_text(*number),
        Word::Text(text) => format!("{} (text)", super::quoted(&shortened(text))),
        Word::Faulty => "something unreadable".to_owned(),
        Word::End => "the end of the file".to_owned(),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// The tree in short, and `offset fault` lines.
    fn read(text: &str) -> (String, Vec<String>) {
        let parsed = parse(text, "Longember");
        let faults = parsed.faults.iter().map(|(offset, fault)| format!("{offset} {fault}")).collect();
        (parsed.root.map_or_else(String::new, |root| short(&root)), faults)
    }

    fn short(node: &Node) -> String {
        let joined = |items: &[Node]| items.iter().map(short).collect::<Vec<_>>().join(" ");
        match &node.value {
            Value::Number(number) => number.to_string(),
            Value::Text(text) => format!("{text:?}"),
            Value::Truth(truth) => truth.to_string(),
            Value::Name(name) => name.clone(),
            Value::List(items) => format!("[{}]", joined(items)),
            Value::Tuple { name, items } => format!("{}({})", name.as_deref().unwrap_or(""), joined(items)),
            Value::Record(Record { name, fields, damaged }) => {
                let fields: Vec<_> =
                    fields.iter().map(|field| format!("{}={}", field.key, short(&field.value))).collect();
                let mark = if *damaged { "!" } else { "" };
                format!("{}{{{}}}{mark}", name.as_deref().unwrap_or(""), fields.join(" "))
            }
            Value::Broken => "?".to_owned(),
        }
    }

    #[test]
    fn the_whole_subset_is_read() {
        let (tree, faults) =
            read("A(b: [1, 2,], c: (d: Some(\"x\"), e: None,), /* f */ g: V(h: true), i: (), j: W(1, 2))");
        assert_eq!(tree, "A{b=[1 2] c={d=Some(\"x\") e=None} g=V{h=true} i={} j=W(1 2)}");
        assert_eq!(faults, Vec::<String>::new());
    }

    #[test]
    fn reading_goes_on_after_each_fault() {
        let (tree, faults) = read("(a: 1 b: 2, c: , d 4, e: 5 kg, f: {1: 2}, g: 7,, h: [1 2], i: 9)");
        assert_eq!(tree, "{a=1 b=2 c=? d=4 e=5 f=? g=7 h=[1 2] i=9}");
        assert_eq!(
            faults,
            [
                "6 found b, allowed a comma before the next key",
                "15 found a comma, allowed a value",
                "19 found 4, allowed a colon after the key",
                "27 found kg, allowed a comma; write a bare value: the unit is part of the key",
                "34 found \"{\", allowed a value; write groups with round brackets and lists with square ones",
                "47 found a comma, allowed one comma between two members; remove it",
                "55 found 2, allowed a comma before the next value",
            ]
        );
    }

    #[test]
    fn brackets_that_do_not_match_are_found() {
        assert_eq!(read("(a: [1, 2)").1, ["4 \"[\" is never closed; add \"]\""]);
        assert_eq!(read("(a: 1").1, ["0 \"(\" is never closed; add \")\""]);
        assert_eq!(
            read("(a: 1]) b").1,
            [
                "5 found \"]\", allowed a bracket that was opened",
                "8 found b, allowed nothing more after the last bracket",
            ]
        );
        assert_eq!(read("(a: 1,5)").1, ["6 found 5, allowed a key and a colon; write decimals with a point"]);
        assert_eq!(read(" // nothing\n").1, ["0 the file is empty, allowed one Longember(…)"]);
    }

    #[test]
    fn a_missing_quote_is_suspected_where_the_text_began() {
        let (_, faults) = read("(name: \"Ember,\n b: \"x\", c: 1)");
        assert_eq!(
            faults[0],
            "20 found x, allowed a comma; perhaps the text that begins in line 1 lacks its closing quote"
        );
        assert!(faults.iter().any(|fault| fault.contains("never closed")), "{faults:?}");
    }

    #[test]
    fn deep_nesting_ends_in_a_fault_not_in_an_overflow() {
        for text in ["(".repeat(200_000), "[".repeat(200_000), "A(b:".repeat(100_000), "{".repeat(200_000)] {
            let parsed = parse(&text, "Longember");
            assert!(!parsed.faults.is_empty());
        }
        let (_, faults) = read(&format!("{}1{}", "[".repeat(40), "]".repeat(40)));
        assert_eq!(faults, ["32 brackets are nested more than 32 deep, allowed 32"]);
    }
}
