// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_line.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "app/notebook/log_line_form.h"
#include "app/notebook/log_line_kinds.h"
#include "app/notebook/log_line_sentence.h"
#include "app/notebook/log_line_words.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using text::TextFault;
using text::textFault;

constexpr std::string_view kToText = "or put note in front to keep the line as text";

/// What the first word of a line may be.
enum class Head { kLamp, kOneForm, kSample, kLiquid, kGas, kAdd, kPhoto, kNote };

struct HeadWord {
  std::string_view word;
  Head head;
  std::string_view kind;  ///< that the word means, or seems to mean where more words decide
};

constexpr auto kHeadWords = std::to_array<HeadWord>({
    {"lamp", Head::kLamp, "lamp on"},
    {"light", Head::kLamp, "lamp on"},
    {"p", Head::kOneForm, event_kind::kPressure},
    {"pressure", Head::kOneForm, event_kind::kPressure},
    {"t", Head::kOneForm, event_kind::kTemperature},
    {"temp", Head::kOneForm, event_kind::kTemperature},
    {"temperature", Head::kOneForm, event_kind::kTemperature},
    {"aliquot", Head::kOneForm, event_kind::kLiquidSample},
    {"sample", Head::kSample, event_kind::kLiquidSample},
    {"liquid", Head::kLiquid, event_kind::kLiquidSample},
    {"gas", Head::kGas, event_kind::kGasSample},
    {"h2", Head::kOneForm, event_kind::kHeadspace},
    {"headspace", Head::kOneForm, event_kind::kHeadspace},
    {"vent", Head::kOneForm, event_kind::kVent},
    {"vented", Head::kOneForm, event_kind::kVent},
    {"purge", Head::kOneForm, event_kind::kPurge},
    {"purged", Head::kOneForm, event_kind::kPurge},
    {"add", Head::kAdd, event_kind::kLiquidAdded},
    {"added", Head::kAdd, event_kind::kLiquidAdded},
    {"collected", Head::kOneForm, event_kind::kCollected},
    {"photo", Head::kPhoto, event_kind::kPhoto},
    {"note", Head::kNote, event_kind::kObservation},
    {"observation", Head::kNote, event_kind::kObservation},
});

/// The first word of a line, by bytes.
struct FirstWord {
  std::size_t begin = 0;
  std::size_t end = 0;
  std::string lowered;
};

bool isLetter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }

FirstWord firstWord(std::string_view line, std::size_t from) {
  FirstWord first;
  first.begin = first.end = skipBlanks(line, from);
  while (first.end < line.size() && isLetter(line[first.end])) ++first.end;
  first.lowered = text::asciiLowered(
      line.substr(first.begin, std::min<std::size_t>(first.end - first.begin, 20)));
  if (first.lowered == "h" && line.substr(first.end).starts_with('2')) {
    first.lowered = "h2";
    ++first.end;
  } else if (first.lowered == "h" && line.substr(first.end).starts_with("\u2082")) {
    first.lowered = "h2";
    first.end += 3;
  }
  return first;
}

/// Whether a word may end here: `p0.42`, `T=35`, `p -0.02`, but not `p-TsOH` or `T-shaped`.
bool endsWord(std::string_view line, std::size_t end) {
  if (end >= line.size() || blankLength(line, end) > 0 || numberEnd(line, end) > end) return true;
  if (line[end] == '.') return end + 1 == line.size() || blankLength(line, end + 1) > 0;
  return std::string_view("=:;,(\r\n").find(line[end]) != std::string_view::npos;
}

const HeadWord* headNamed(std::string_view lowered) {
  const auto found = std::ranges::find(kHeadWords, lowered, &HeadWord::word);
  return found == kHeadWords.end() ? nullptr : &*found;
}

/// Whether one letter added, left out, changed or swapped with its neighbour makes the other word.
bool isOneSlipAway(std::string_view written, std::string_view meant) {
  const auto [a, b] = std::ranges::mismatch(written, meant);
  const std::string_view restA(a, written.end());
  const std::string_view restB(b, meant.end());
  if (restA.empty() && restB.empty()) return false;
  const auto without = [](std::string_view word, std::size_t n) {
    return word.substr(std::min(n, word.size()));
  };
  if (without(restA, 1) == without(restB, 1)) return true;
  if (without(restA, 1) == restB || restA == without(restB, 1)) return true;
  return restA.size() > 1 && restB.size() > 1 && restA[0] == restB[1] && restA[1] == restB[0] &&
         without(restA, 2) == without(restB, 2);
}

/// One reading of one line.
class LineReader {
 public:
  /// LabelCheck::kNo: only whether the line is a shorthand matters, so hints are not looked for
  /// either.
  LineReader(std::string_view line, LabelCheck check) : m_line(line), m_check(check) {
    m_read.event.raw = line;
  }

  ReadEntry run() {
    const std::size_t begin = skipBlanks(m_line, 0);
    if (begin >= trimmedEnd(m_line)) {
      keepAsText(m_line);
      doubt({begin, 0, "nothing is written here", "write what happened"}, {});
      return std::move(m_read);
    }
    const FirstWord written = firstWord(m_line, 0);
    const FirstWord first = splitLamp(written);
    const HeadWord* head = headNamed(first.lowered);
    if (head == nullptr || (first.end == written.end && !endsWord(m_line, first.end))) {
      keepAsText(m_line);
      if (m_check == LabelCheck::kYes) hintAtShorthand(first);
    } else if (auto read = readHead(*head, first.end); !read) {
      m_read.event = EventRecord();
      m_read.event.raw = m_line;
      m_read.photo.clear();
      keepAsText(m_line);
      doubt(std::move(read.error()), m_meant.empty() ? head->kind : m_meant);
      m_read.likelyText = isLikelyText(first.end, head->head == Head::kLamp);
    }
    return std::move(m_read);
  }

 private:
  using Step = std::expected<void, TextFault>;

  /// `lampon` without its blank.
  static FirstWord splitLamp(FirstWord first) {
    if (first.lowered != "lampon" && first.lowered != "lampoff") return first;
    first.lowered.resize(4);
    first.end = first.begin + 4;
    return first;
  }

  void keepAsText(std::string_view note) {
    m_read.event.kind = event_kind::kObservation;
    m_read.event.note = note;
  }

  void doubt(TextFault fault, std::string_view meant) {
    if (!meant.empty()) fault.mend = fmt::format("{}, {}", fault.mend, kToText);
    m_read.doubt = std::move(fault);
    m_read.meant = meant;
  }

  Step readHead(const HeadWord& head, std::size_t end) {
    switch (head.head) {
      case Head::kLamp:
        return readLamp(end);
      case Head::kPhoto:
        return readPhoto(end);
      case Head::kNote:
        return readNote(end);
      case Head::kSample: {
        const FirstWord second = firstWord(m_line, end);
        const bool named = second.lowered == "gas" || second.lowered == "liquid";
        return readForm(
            second.lowered == "gas" ? event_kind::kGasSample : event_kind::kLiquidSample,
            named ? second.end : end);
      }
      case Head::kLiquid:
      case Head::kGas:
        return readSampleOrAdded(head.head == Head::kGas, end);
      case Head::kAdd:
        return readAdded(end);
      case Head::kOneForm:
        break;
    }
    return readForm(head.kind, end);
  }

  Step readForm(std::string_view kind, std::size_t from) {
    m_meant = kind;
    return readLogForm(m_line, behindSign(from), kind, m_read.event, m_check);
  }

  /// Behind `:` or a full stop that stands after the word.
  std::size_t behindSign(std::size_t from) const {
    const bool stop =
        from < m_line.size() && m_line[from] == '.' && numberEnd(m_line, from) == from;
    return stop || m_line.substr(from).starts_with(':') ? from + 1 : from;
  }

  Step readLamp(std::size_t from) {
    const FirstWord second = firstWord(m_line, behindSign(from));
    const bool on = second.lowered == "on";
    if ((!on && second.lowered != "off") || !endsWord(m_line, second.end)) {
      const std::size_t end = std::max(trimmedEnd(m_line), second.begin);
      m_meant = event_kind::kLampOn;
      return textFault(second.begin, end - second.begin,
                       end == second.begin ? "on or off is missing" : "on or off is wanted here",
                       "write lamp on or lamp off");
    }
    return readForm(on ? event_kind::kLampOn : event_kind::kLampOff, second.end);
  }

  Step readSampleOrAdded(bool gas, std::size_t from) {
    const FirstWord second = firstWord(m_line, from);
    if (second.lowered == "sample") {
      return readForm(gas ? event_kind::kGasSample : event_kind::kLiquidSample, second.end);
    }
    if (second.lowered == "added" || second.lowered == "add") {
      return readForm(gas ? event_kind::kGasAdded : event_kind::kLiquidAdded, second.end);
    }
    if (gas) return readForm(event_kind::kGasSample, from);
    m_meant = event_kind::kLiquidSample;
    const std::size_t end = std::max(trimmedEnd(m_line), second.begin);
    return textFault(second.begin, end - second.begin, "sample or added is wanted behind liquid",
                     "write liquid sample 50 uL or add 0.2 mL acetonitrile");
  }

  /// A gas where one is named, else a liquid: `add 2 mL H2`, `add 0.2 mL acetonitrile`.
  Step readAdded(std::size_t from) {
    const FirstWord second = firstWord(m_line, behindSign(from));
    if (second.lowered == "gas") return readForm(event_kind::kGasAdded, second.end);
    if (second.lowered == "liquid") return readForm(event_kind::kLiquidAdded, second.end);
    const EventRecord before = m_read.event;
    if (readForm(event_kind::kGasAdded, from)) return {};
    m_read.event = before;
    return readForm(event_kind::kLiquidAdded, from);
  }

  Step readPhoto(std::size_t from) {
    m_meant = event_kind::kPhoto;
    const std::size_t begin = skipBlanks(m_line, behindSign(from));
    const std::size_t end = trimmedEnd(m_line);
    if (begin >= end) {
      return textFault(std::min(begin, end), 0, "the file is missing",
                       "write photo and the file's name");
    }
    std::string_view file = m_line.substr(begin, end - begin);
    if (file.size() > 2 && (file.front() == '"' || file.front() == '\'') &&
        file.front() == file.back()) {
      file = file.substr(1, file.size() - 2);
    }
    const std::size_t folder = file.find_last_of("/\\");
    if (folder + 1 == file.size()) {
      return textFault(begin, end - begin, "this names a folder, not a file",
                       "write photo and the file's name");
    }
    m_read.photo = file;
    m_read.event.kind = event_kind::kPhoto;
    m_read.event.attachmentName = folder == std::string_view::npos ? file : file.substr(folder + 1);
    return {};
  }

  Step readNote(std::size_t from) {
    m_meant = event_kind::kObservation;
    const std::size_t begin = skipBlanks(m_line, behindSign(from));
    if (begin >= trimmedEnd(m_line)) {
      return textFault(std::min(begin, m_line.size()), 0, "the text is missing",
                       "write note and what you saw");
    }
    keepAsText(m_line.substr(begin));
    return {};
  }

  /// No figure, no unit, and more than the one or two words that a shorthand without figures has.
  bool isLikelyText(std::size_t from, bool lamp) const {
    if (m_meant == event_kind::kPhoto) return false;
    const LogTokens pieces = logTokens(m_line, from);
    const std::string_view rest = m_line.substr(std::min(from, m_line.size()));
    if (std::ranges::any_of(rest, [](char c) { return c >= '0' && c <= '9'; })) return false;
    // A unit tells of a figure in words (`fifty uL`); in a longer text it is a word (`at the stir
    // bar`).
    const auto isUnit = [&](const LogToken& token) {
      return logUnit(token.of(m_line)).has_value();
    };
    if (pieces.tokens.size() <= 3 && std::ranges::any_of(pieces.tokens, isUnit)) return false;
    const bool wordsAlone = lamp || m_meant == event_kind::kVent || m_meant == event_kind::kPurge;
    return pieces.tokens.size() > (wordsAlone ? 2U : 0U);
  }

  /// A text that would be a shorthand but for a slip in its first word, or for the want of one.
  void hintAtShorthand(const FirstWord& first) {
    if (first.lowered.size() >= 4 && endsWord(m_line, first.end)) return hintAtWord(first);
    if (numberEnd(m_line, first.begin) == first.begin) return;
    for (const std::string_view word : {"p", "T", "aliquot", "h2"}) {
      if (word == "h2" && m_line.find('%') == std::string_view::npos) continue;
      const std::string longer = fmt::format("{} {}", word, m_line.substr(first.begin, 60));
      const ReadEntry read = m_line.size() - first.begin > 60
                                 ? ReadEntry{}
                                 : LineReader(longer, LabelCheck::kNo).run();
      const bool label = read.event.kind == event_kind::kLiquidSample && !read.event.note.empty();
      if (read.event.kind.empty() || read.event.kind == event_kind::kObservation || label) continue;
      const bool sample = word == "aliquot";
      return doubt(
          {first.begin, 0, sample ? "a volume without a word" : "a reading without its word",
           sample ? "put aliquot or gas in front" : fmt::format("put {} in front", word)},
          read.event.kind);
    }
  }

  void hintAtWord(const FirstWord& first) {
    for (const HeadWord& head : kHeadWords) {
      // Any text may follow photo and note, so that their neighbours (photos) mean nothing.
      if (head.word.size() < 4 || head.head == Head::kPhoto || head.head == Head::kNote) continue;
      if (!isOneSlipAway(first.lowered, head.word)) continue;
      const std::string mended = std::string(head.word) + std::string(m_line.substr(first.end));
      const ReadEntry read = LineReader(mended, LabelCheck::kNo).run();
      if (read.event.kind == event_kind::kObservation) continue;
      const std::size_t length = first.end - first.begin;
      return doubt({first.begin, length,
                    fmt::format("{} is no word of the log",
                                text::quoted(m_line.substr(first.begin, length))),
                    fmt::format("write {}", head.word)},
                   read.event.kind);
    }
  }

  std::string_view m_line;
  LabelCheck m_check;
  ReadEntry m_read;
  std::string_view m_meant;
};

}  // namespace

bool ReadEntry::isUnfinished() const {
  return doubt && doubt->length == 0 && doubt->offset >= trimmedEnd(event.raw);
}

bool readsAsEvent(std::string_view line) {
  return LineReader(line, LabelCheck::kNo).run().event.kind != event_kind::kObservation;
}

ReadEntry readLogLine(std::string_view line) {
  ReadEntry read = LineReader(line, LabelCheck::kYes).run();
  read.sentence = eventSentence(read.event);
  if (read.doubt && !read.meant.empty()) {
    read.sentence = fmt::format("text, not {}: {}", read.meant, text::quoted(read.event.note));
  }
  return read;
}

ReadEntry readAddendum(std::string_view line) {
  ReadEntry read;
  read.event.kind = event_kind::kAddendum;
  read.event.raw = line;
  read.event.note = line;
  read.sentence = eventSentence(read.event);
  if (trimmedEnd(line) == 0)
    read.doubt = TextFault{0, 0, "nothing is written here", "write what is to be added"};
  return read;
}

}  // namespace vialkeeper::app
