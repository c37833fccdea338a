// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_line_form.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <optional>
#include <string>

#include "app/notebook/log_line_kinds.h"
#include "app/notebook/log_line_words.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using text::TextFault;
using text::textFault;
using units::Kind;
using units::Range;
using Step = std::expected<void, TextFault>;

// What a form takes and needs.
constexpr unsigned kP = 1, kT = 2, kV = 4, kN = 8, kX = 16, kD = 32, kG = 64, kText = 128;

/// What a pressure without `gauge` or `abs` is.
enum class PressureRule { kGauge, kAbsolute, kMustSay };

struct Form {
  std::string_view kind;
  unsigned takes;
  unsigned needs;
  PressureRule pressure;
  std::string_view example;
};

constexpr auto kForms = std::to_array<Form>({
    {event_kind::kLampOn, kT, 0, PressureRule::kGauge, "lamp on"},
    {event_kind::kLampOff, kT, 0, PressureRule::kGauge, "lamp off"},
    {event_kind::kPressure, kP | kT, kP, PressureRule::kGauge, "p 0.42 bar 35 C"},
    {event_kind::kTemperature, kT, kT, PressureRule::kGauge, "T 35 C"},
    {event_kind::kHeadspace, kX | kP | kT | kG, kX, PressureRule::kMustSay, "h2 12.3 %"},
    {event_kind::kGasSample, kV | kT | kText, kV, PressureRule::kGauge, "gas 250 uL"},
    {event_kind::kLiquidSample, kV | kT | kText, kV, PressureRule::kGauge, "aliquot 50 uL"},
    {event_kind::kVent, kG | kP | kT | kD, 0, PressureRule::kMustSay, "vent"},
    {event_kind::kPurge, kG | kP | kT | kD, 0, PressureRule::kMustSay, "purge N2"},
    {event_kind::kCollected, kV | kT | kP, kV | kT, PressureRule::kAbsolute,
     "collected 4.2 mL 21 C"},
    {event_kind::kGasAdded, kV | kN | kP | kT | kG, kG, PressureRule::kMustSay, "add gas 2 mL H2"},
    {event_kind::kLiquidAdded, kV | kText, kV | kText, PressureRule::kGauge,
     "add 0.2 mL acetonitrile"},
});

unsigned itemOf(Kind kind) {
  switch (kind) {
    case Kind::kPressure:
      return kP;
    case Kind::kTemperature:
      return kT;
    case Kind::kVolume:
      return kV;
    case Kind::kAmount:
      return kN;
    case Kind::kMolPercent:
    case Kind::kPercent:
      return kX;
    case Kind::kDuration:
      return kD;
    default:
      return 0;
  }
}

std::string_view nameOfItem(unsigned item) {
  switch (item) {
    case kP:
      return "pressure";
    case kT:
      return "temperature";
    case kV:
      return "volume";
    case kN:
      return "amount";
    case kX:
      return "fraction";
    case kD:
      return "time span";
    case kG:
      return "gas";
    default:
      return "name of the liquid";
  }
}

/// Reads the tokens behind an event's word into its fields.
class FormReader {
 public:
  FormReader(std::string_view line, std::size_t from, const Form& form, EventRecord& event,
             LabelCheck check)
      : m_line(line),
        m_pieces(logTokens(line, from)),
        m_form(form),
        m_event(event),
        m_check(check) {}

  Step run() {
    m_event.kind = m_form.kind;
    for (m_at = 0; m_at < m_pieces.tokens.size(); ++m_at) {
      const LogToken& token = m_pieces.tokens[m_at];
      if (Step step = token.isNumber ? takeNumber(token) : takeWord(token); !step) return step;
    }
    if (Step step = checkNeeds(); !step) return step;
    if (Step step = checkText(); !step) return step;
    if (Step step = settlePressure(); !step) return step;
    settleNote();
    return {};
  }

 private:
  bool takes(unsigned item) const { return (m_form.takes & item) != 0; }
  bool has(unsigned item) const { return (m_has & item) != 0; }
  bool wants(unsigned item) const { return takes(item) && !has(item); }
  std::string_view written(const LogToken& token) const { return token.of(m_line); }
  std::string example() const { return fmt::format("write it like {}", m_form.example); }

  Step takeNumber(const LogToken& token) {
    const auto& unit = token.unit;
    if (!takes(kText) && m_line.substr(token.unitBegin).starts_with(':') && token.hasUnit())
      return timeInLine(token);
    const unsigned item = unit ? itemOf(unit->unit->kind) : !token.hasUnit() && wants(kX) ? kX : 0;
    if (isText(token, item)) return takeText(token);
    if (item != 0 && takes(item) && has(item)) {
      return textFault(token.begin, token.end - token.begin,
                       fmt::format("a second {} in one line", nameOfItem(item)),
                       "write one event in a line");
    }
    m_textOpen = false;
    if (item == kX && wants(kX)) return takeFraction(token);
    if (item == kP && wants(kP) && unit && !unit->pressureKind.empty()) {
      if (Step step = takePressureKind(token, unit->pressureKind); !step) return step;
    }
    return takeQuantity(token);
  }

  /// A number that belongs to a name or label: `1,4-dioxane`, `S 3`, `2 M HCl`.
  bool isText(const LogToken& token, unsigned item) const {
    if (!takes(kText)) return false;
    const bool wanted = item != 0 && wants(item);
    if (m_textOpen) return !(wanted && item == kV);
    if (wanted) return false;
    if (!token.standsFree()) return has(kV) && !token.unit;
    const auto& unit = token.unit;
    const bool solution =
        unit && (unit->unit->kind == Kind::kConcentration || unit->unit->kind == Kind::kPercent);
    return has(kV) && solution && m_form.kind == event_kind::kLiquidAdded;
  }

  Step takeQuantity(const LogToken& token) {
    // A fault names the kind that is wanted most: what is needed before what is only taken.
    const unsigned open = m_form.needs & ~m_has & ~(kText | kG);
    const unsigned wanted = open != 0 ? open : m_form.takes & ~m_has;
    const auto& unit = token.unit;
    const unsigned given = unit ? itemOf(unit->unit->kind) : 0;
    const unsigned item = given != 0 && wants(given) ? given : wanted;
    if ((item & kN) != 0 && (item & kV) != 0) {
      return keep(readToken(m_line, token, {Kind::kVolume, Kind::kAmount}, Range::kPositive),
                  token);
    }
    if ((item & kP) != 0)
      return keep(readToken(m_line, token, {Kind::kPressure}, Range::kAny), token);
    if ((item & kV) != 0)
      return keep(readToken(m_line, token, {Kind::kVolume}, Range::kPositive), token);
    if ((item & kN) != 0)
      return keep(readToken(m_line, token, {Kind::kAmount}, Range::kPositive), token);
    if ((item & kT) != 0)
      return keep(readToken(m_line, token, {Kind::kTemperature}, Range::kAny), token);
    if ((item & kD) != 0)
      return keep(readToken(m_line, token, {Kind::kDuration}, Range::kPositive), token);
    if ((item & kX) != 0) return takeFraction(token);
    return textFault(token.begin, token.end - token.begin, "one quantity too many", example());
  }

  Step keep(const std::expected<units::ReadQuantity, TextFault>& read, const LogToken& token) {
    if (!read) return std::unexpected(read.error());
    m_has |= itemOf(read->kind);
    switch (read->kind) {
      case Kind::kPressure:
        m_event.pressure_bar = inUnit(*read, "bar");
        m_pressure = token;
        break;
      case Kind::kTemperature: {
        // Kelvin less 273.15 leaves a rest in the last bits.
        const bool celsius = read->symbol != "K";
        m_event.temperature_C =
            celsius ? read->number : std::round((read->si - 273.15) * 1e9) / 1e9;
        break;
      }
      case Kind::kVolume:
        m_event.volume_uL = inUnit(*read, "uL");
        m_has |= kN;
        break;
      case Kind::kAmount:
        m_event.amount_mmol = inUnit(*read, "mmol");
        m_has |= kV;
        break;
      default:
        m_duration = written(token);
        break;
    }
    return {};
  }

  Step takeFraction(const LogToken& token) {
    const auto& unit = token.unit;
    if (token.hasUnit() && (!unit || itemOf(unit->unit->kind) != kX)) {
      return textFault(token.unitBegin, token.unitEnd - token.unitBegin,
                       "a fraction or a percentage is wanted", "write it like 12.3 % or 0.123");
    }
    const auto number = units::readNumber(m_line.substr(token.begin, token.numberEnd - token.begin),
                                          units::Dialect::kPerson);
    if (!number) {
      TextFault fault = number.error();
      fault.offset += token.begin;
      return std::unexpected(std::move(fault));
    }
    const double fraction = unit ? *number / 100.0 : *number;
    if (!(fraction >= 0.0 && fraction <= 1.0)) {
      return textFault(token.begin, token.end - token.begin,
                       unit ? "a percentage outside 0 to 100" : "a fraction outside 0 to 1",
                       unit ? "check the figure" : "write a percentage with its %");
    }
    m_event.fraction = fraction;
    m_has |= kX;
    return {};
  }

  Step takeWord(const LogToken& token) {
    const std::string_view word = written(token);
    if (takes(kText)) return takeText(token);
    const auto gas = gasNamed(word);
    if (gas && takes(kG)) return takeGas(token, *gas);
    const auto kind = pressureKindNamed(word);
    if (kind && takes(kP) && (word.size() > 1 || has(kP))) return takePressureKind(token, *kind);
    const std::string lowered = text::asciiLowered(word.substr(0, 12));
    const bool collecting = m_form.kind == event_kind::kCollected &&
                            (lowered == "over" || lowered == "water" || lowered == "barometer");
    const bool venting = m_form.kind == event_kind::kVent && lowered == "ambient" && !has(kP);
    const bool more = m_at + 1 < m_pieces.tokens.size();
    if (collecting || venting || (isJoint(word) && more)) return {};
    return textFault(token.begin, token.end - token.begin,
                     fmt::format("{} is not understood here", text::quoted(word)),
                     fmt::format("{}{}, with a remark behind a semicolon", example(),
                                 takes(kG) ? ", the gas one of H2 N2 O2 Ar CO2 CO CH4" : ""));
  }

  static Step timeInLine(const LogToken& token) {
    return textFault(token.begin, token.end - token.begin, "a time of day is no part of the line",
                     "give the time in its own place (--at)");
  }

  Step takeGas(const LogToken& token, std::string_view gas) {
    const bool headspace = m_form.kind == event_kind::kHeadspace;
    if (headspace && gas != "H2") {
      return textFault(token.begin, token.end - token.begin, "the reading is the fraction of H2",
                       example());
    }
    if (gas == "air" && m_form.kind == event_kind::kGasAdded) {
      return textFault(token.begin, token.end - token.begin, "air is a mixture",
                       "add N2 and O2 in a line each");
    }
    if (has(kG))
      return textFault(token.begin, token.end - token.begin, "a second gas in one line",
                       "name one gas");
    m_has |= kG;
    if (!headspace) m_event.gas = gas;
    return {};
  }

  Step takePressureKind(const LogToken& token, std::string_view kind) {
    if (!m_event.pressureKind.empty() && m_event.pressureKind != kind) {
      return textFault(token.begin, token.end - token.begin, "gauge and absolute in one line",
                       "keep one of the two");
    }
    if (kind == "gauge" && m_form.pressure == PressureRule::kAbsolute) {
      return textFault(token.begin, token.end - token.begin,
                       "a barometer shows an absolute pressure",
                       "give the barometer's reading, such as 1013 mbar");
    }
    if (m_event.pressureKind.empty()) m_pressureWord = token;
    m_event.pressureKind = kind;
    return {};
  }

  /// Text runs until a volume that is still wanted; it must not begin twice.
  Step takeText(const LogToken& token) {
    const bool before = m_textEnd == 0;
    const std::string lowered = text::asciiLowered(written(token).substr(0, 12));
    if (before && (lowered == "of" || (isJoint(lowered) && nextIsTaken()))) return {};
    if (!before && !m_textOpen) {
      return textFault(token.begin, token.end - token.begin, "text on both sides of the volume",
                       fmt::format("{}, with a remark behind a semicolon", example()));
    }
    if (before) m_textBegin = token.begin;
    m_textOpen = true;
    m_textEnd = token.end;
    m_has |= kText;
    return {};
  }

  bool nextIsTaken() const {
    if (m_at + 1 >= m_pieces.tokens.size() || !m_pieces.tokens[m_at + 1].isNumber) return false;
    const auto& unit = m_pieces.tokens[m_at + 1].unit;
    return unit && wants(itemOf(unit->unit->kind));
  }

  Step checkNeeds() const {
    const bool quantity = m_form.kind == event_kind::kGasAdded && !has(kV);
    const unsigned missing = (m_form.needs & ~m_has) | (quantity ? kV : 0U);
    if (missing == 0) return {};
    for (const unsigned item : {kV, kP, kX, kT, kG, kText}) {
      // Where a text stands in place of the quantity, that is what to point at.
      if ((missing & item) == 0) continue;
      const bool text = m_textEnd > 0 && item == kV;
      const std::size_t begin = text ? m_textBegin : m_pieces.end;
      return textFault(begin, text ? m_textEnd - begin : 0,
                       fmt::format("the {} is missing", nameOfItem(item)), example());
    }
    return {};
  }

  /// What is left over as text must not hide a quantity or a second event.
  Step checkText() const {
    if (m_textEnd == 0 || m_check == LabelCheck::kNo) return {};
    const std::string_view text = m_line.substr(m_textBegin, m_textEnd - m_textBegin);
    const bool name = m_form.kind == event_kind::kLiquidAdded;
    for (const LogToken& token : m_pieces.tokens) {
      if (token.begin < m_textBegin || token.end > m_textEnd || !token.standsFree()) continue;
      const auto& unit = token.unit;
      const unsigned item = unit ? itemOf(unit->unit->kind) : 0;
      const bool solution = unit && (item == 0 || item == kX) && unit->unit->kind != Kind::kMass;
      if (!name && item == kP) {
        return textFault(token.begin, token.end - token.begin,
                         "a pressure in the label of a sample",
                         "log the reading in a line of its own");
      }
      if (name && !solution) {
        return textFault(token.begin, token.end - token.begin, "a figure in the name of the liquid",
                         fmt::format("{}, with a remark behind a semicolon", example()));
      }
    }
    if (name && gasNamed(text)) {
      return textFault(m_textBegin, text.size(), "a gas where a liquid is wanted",
                       "write it like add gas 2 mL H2");
    }
    std::string_view rest = text;
    for (const std::string_view joint : {"and ", "then ", "+ ", "& "}) {
      if (text::asciiLowered(text.substr(0, joint.size())) == joint)
        rest = text.substr(joint.size());
    }
    const bool second = numberEnd(rest, 0) > 0 && rest.size() < text.size();
    if (!second && !readsAsEvent(rest)) return {};
    return textFault(m_textBegin, text.size(), "a second event in one line",
                     "write one event in a line");
  }

  Step settlePressure() {
    if (!m_event.pressure_bar) {
      if (m_event.pressureKind.empty()) return {};
      return textFault(m_pressureWord.end, 0, "the pressure is missing", example());
    }
    if (m_event.pressureKind.empty()) {
      if (m_form.pressure == PressureRule::kMustSay) {
        return textFault(m_pressure.end, 0, "gauge or abs is missing",
                         "say gauge or abs behind the pressure");
      }
      m_event.pressureKind = m_form.pressure == PressureRule::kGauge ? "gauge" : "abs";
    }
    // No barometer stands above 1.1 bar, so nothing can be further below it.
    const double lowest = m_event.pressureKind == "gauge" ? -1.1 : 0.0;
    if (*m_event.pressure_bar > lowest) return {};
    return textFault(m_pressure.begin, m_pressure.end - m_pressure.begin, "a pressure below vacuum",
                     "check the sign, and whether it is gauge or abs");
  }

  void settleNote() {
    if (m_textEnd > 0) m_event.note = m_line.substr(m_textBegin, m_textEnd - m_textBegin);
    if (!m_duration.empty()) m_event.note = m_duration;
    // The note of a liquid names the solvent and nothing else; its remark stays in the raw line.
    if (m_pieces.remark.empty() || m_form.kind == event_kind::kLiquidAdded) return;
    m_event.note += fmt::format("{}{}", m_event.note.empty() ? "" : "; ", m_pieces.remark);
  }

  std::string_view m_line;
  LogTokens m_pieces;
  const Form& m_form;
  EventRecord& m_event;
  LabelCheck m_check;
  std::size_t m_at = 0;
  unsigned m_has = 0;
  bool m_textOpen = false;
  std::size_t m_textBegin = 0;
  std::size_t m_textEnd = 0;
  LogToken m_pressure;
  LogToken m_pressureWord;
  std::string_view m_duration;
};

}  // namespace

Step readLogForm(std::string_view line, std::size_t from, std::string_view kind, EventRecord& event,
                 LabelCheck check) {
  const auto form = std::ranges::find(kForms, kind, &Form::kind);
  return FormReader(line, from, *form, event, check).run();
}

}  // namespace vialkeeper::app
