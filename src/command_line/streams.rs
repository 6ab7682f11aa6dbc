//! Where a command reads and writes.

use std::io::{self, Read, Write};

/// Standard input, output and error of a command, or what stands for them in a test.
pub struct Streams<'a> {
    /// Where a scenario named `-` is read.
    pub input: &'a mut dyn Read,
    /// Where results go.
    pub results: &'a mut dyn Write,
    /// Where messages go.
    pub messages: &'a mut dyn Write,
    /// Whether somebody watches the messages as they come, so that progress is worth showing.
    pub shows_progress: bool,
}

impl Streams<'_> {
    /// Writes a result.
    ///
    /// A reader that stops listening, as `head` does, has what it wants: that is no error.
    pub(super) fn result(&mut self, text: &str) -> io::Result<()> {
        self.result_bytes(text.as_bytes())
    }

    /// Writes a result that is no text.
    pub(super) fn result_bytes(&mut self, bytes: &[u8]) -> io::Result<()> {
        match self.results.write_all(bytes).and_then(|()| self.results.flush()) {
            Err(error) if error.kind() == io::ErrorKind::BrokenPipe => Ok(()),
            written => written,
        }
    }

    /// Shows how much of a long computation is done, on a line that is written over; nothing where nobody watches.
    pub(super) fn progress(&mut self, percent: u32) {
        if self.shows_progress {
            let _ = write!(self.messages, "\rcomputing … {percent} % ");
            let _ = self.messages.flush();
        }
    }

    /// Clears the line of progress.
    pub(super) fn end_progress(&mut self) {
        if self.shows_progress {
            let _ = write!(self.messages, "\r                    \r");
            let _ = self.messages.flush();
        }
    }

    /// Writes a message. There is nowhere left to report that this failed, so a failure is let go.
    pub(super) fn message(&mut self, text: &str) {
        let _ = writeln!(self.messages, "{}", text.trim_end());
        let _ = self.messages.flush();
    }
}
