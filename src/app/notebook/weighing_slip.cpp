// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/weighing_slip.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <utility>

#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

using units::Mass;
using units::Volume;

constexpr double kOffTarget = 0.25;
constexpr double kSameFigure = 0.02;

// Units a factor of 1000 apart, from small to large.
constexpr auto kMassUnits = std::to_array<std::string_view>({"ug", "mg", "g", "kg"});
constexpr auto kVolumeUnits = std::to_array<std::string_view>({"uL", "mL", "L"});

std::string shownOf(const Recorded& recorded) {
  return std::visit([](auto quantity) { return units::shown(quantity); }, recorded);
}

double siOf(const Recorded& recorded) {
  return std::visit([](auto quantity) { return quantity.si(); }, recorded);
}

Recorded scaled(const Recorded& recorded, double factor) {
  return std::visit(
      [factor](auto quantity) {
        return Recorded(decltype(quantity)::fromSi(quantity.si() * factor));
      },
      recorded);
}

/// The target in the kind of quantity that was recorded, if there is one to compare with.
std::optional<Recorded> targetLike(const charge::ComponentCharge& target, const Recorded& actual) {
  if (std::holds_alternative<Volume>(actual)) {
    if (target.targetVolume) return *target.targetVolume;
    return std::nullopt;
  }
  if (target.targetMass) return *target.targetMass;
  if (target.targetVolume && target.density) return *target.density * *target.targetVolume;
  return std::nullopt;
}

/// The power of ten by which the ratio is off, 0 where it is none.
int powerOfTen(double ratio) {
  for (const int power : {1, -1, 2, -2, 3, -3, 6, -6}) {
    if (std::abs(ratio / std::pow(10.0, power) - 1.0) <= kOffTarget) return power;
  }
  return 0;
}

/// What was typed, taken to its number and unit.
std::optional<units::ReadQuantity> typed(std::string_view asWritten) {
  const auto read = units::readQuantityOf({units::Kind::kMass, units::Kind::kVolume}, asWritten,
                                          units::Dialect::kPerson);
  return read ? std::optional(*read) : std::nullopt;
}

std::string_view usualSpelling(std::string_view symbol) {
  if (symbol == "ml") return "mL";
  if (symbol == "ul") return "uL";
  return symbol == "l" ? "L" : symbol;
}

/// The unit so many thousands smaller, or empty where there is none.
std::string_view unitBelow(std::string_view symbol, int thousands) {
  const auto among = [&](auto units) -> std::string_view {
    const auto found = std::ranges::find(units, usualSpelling(symbol));
    const auto place = (found - units.begin()) - thousands;
    if (found == units.end() || place < 0 || place >= static_cast<std::ptrdiff_t>(units.size()))
      return {};
    return units[static_cast<std::size_t>(place)];
  };
  const std::string_view mass = among(kMassUnits);
  return mass.empty() ? among(kVolumeUnits) : mass;
}

/// The figures as typed with the other unit or the decimal sign moved; else as quantities are
/// shown.
std::string likelyText(const Recorded& likely, std::string_view asWritten, int power) {
  const auto read = typed(asWritten);
  if (!read) return shownOf(likely);
  if (power % 3 == 0) {
    const std::string_view unit = unitBelow(read->symbol, power / 3);
    return unit.empty() ? shownOf(likely) : fmt::format("{:.10g} {}", read->number, unit);
  }
  return fmt::format("{:.10g} {}", read->number / std::pow(10.0, power),
                     usualSpelling(read->symbol));
}

std::string written(const Recorded& actual, std::string_view asWritten) {
  const std::string_view trimmed = text::trimmed(asWritten);
  return trimmed.empty() || trimmed.size() > 40 ? shownOf(actual) : text::oneLine(trimmed);
}

/// Which of the two is usual for a supply: by its device, else by its kind. Neat liquids go by
/// either.
enum class Usual { kMass, kVolume, kEither };

Usual usualFor(const charge::ComponentPlan& plan) {
  if (plan.device) return plan.device->balance() != nullptr ? Usual::kMass : Usual::kVolume;
  if (std::holds_alternative<charge::SolidSupply>(plan.supply)) return Usual::kMass;
  if (std::holds_alternative<charge::LiquidSupply>(plan.supply) && !plan.isSolvent())
    return Usual::kEither;
  return Usual::kVolume;
}

class Questioner {
 public:
  Questioner(const charge::ComponentPlan& plan, const charge::ComponentCharge& target,
             const Recorded& actual, std::string_view asWritten)
      : m_plan(plan), m_target(target), m_actual(actual), m_asWritten(asWritten) {}

  std::vector<SlipQuestion> run() {
    askForOtherQuantity();
    askForSize();
    return std::move(m_questions);
  }

 private:
  /// The target of the other kind, if its figure is the one that was typed: `100 mg` for 100 µL.
  std::optional<Recorded> sameFigure() const {
    const auto close = [](double a, double b) {
      return b > 0.0 && std::abs(a / b - 1.0) <= kSameFigure;
    };
    if (const auto* mass = std::get_if<Mass>(&m_actual)) {
      const bool same =
          m_target.targetVolume && close(mass->milligrams(), m_target.targetVolume->microlitres());
      return same ? std::optional<Recorded>(Volume::fromMicrolitres(mass->milligrams()))
                  : std::nullopt;
    }
    const double uL = std::get<Volume>(m_actual).microlitres();
    const bool same = m_target.targetMass && close(uL, m_target.targetMass->milligrams());
    return same ? std::optional<Recorded>(Mass::fromMilligrams(uL)) : std::nullopt;
  }

  bool isOffTarget(double least) const {
    const auto like = targetLike(m_target, m_actual);
    if (!like || !(siOf(*like) > 0.0)) return true;
    return std::abs(siOf(m_actual) / siOf(*like) - 1.0) > least;
  }

  Recorded otherTarget(bool mass) const {
    if (mass) return *m_target.targetVolume;
    return *m_target.targetMass;
  }

  void askForOtherQuantity() {
    const bool mass = std::holds_alternative<Mass>(m_actual);
    const Usual usual = usualFor(m_plan);
    const bool unusual = usual == (mass ? Usual::kVolume : Usual::kMass);
    // With a density near 1 the figures of both targets agree, and either may stand.
    const auto meant = isOffTarget(kSameFigure) ? sameFigure() : std::nullopt;
    if (!unusual && !meant) return;
    SlipQuestion question{
        .kind = SlipKind::kOtherQuantity, .what = {}, .ask = {}, .likely = meant, .likelyText = {}};
    question.what = unusual
                        ? fmt::format("{} is {}, but {} is {}", written(m_actual, m_asWritten),
                                      mass ? "a mass" : "a volume", m_plan.name,
                                      mass ? "usually taken by volume" : "usually weighed")
                        : fmt::format("{} has the figure of the target of {}",
                                      written(m_actual, m_asWritten), shownOf(otherTarget(mass)));
    if (meant) question.likelyText = shownOf(*meant);
    question.ask = meant ? fmt::format("did you mean {}?", question.likelyText)
                         : fmt::format("was it really {}?", mass ? "weighed" : "taken by volume");
    m_questions.push_back(std::move(question));
  }

  void askForSize() {
    const auto target = targetLike(m_target, m_actual);
    if (!target || !(siOf(*target) > 0.0) || !std::isfinite(siOf(m_actual))) return;
    const double ratio = siOf(m_actual) / siOf(*target);
    if (std::abs(ratio - 1.0) <= kOffTarget) return;
    const int power = powerOfTen(ratio);
    if (power != 0) return askForPower(*target, power);
    // A figure of the other kind explains the size already.
    if (!m_questions.empty() && m_questions.front().likely) return;
    const std::string size = ratio > 2.0 ? fmt::format("{:.3g} times", ratio)
                                         : fmt::format("{:.0f} % {}", std::abs(ratio - 1.0) * 100.0,
                                                       ratio > 1.0 ? "above" : "below");
    m_questions.push_back(
        {.kind = SlipKind::kOffTarget,
         .what = fmt::format("{} is {} the target of {}", written(m_actual, m_asWritten), size,
                             shownOf(*target)),
         .ask = "is the figure right?",
         .likely = std::nullopt,
         .likelyText = {}});
  }

  void askForPower(const Recorded& target, int power) {
    const Recorded likely = scaled(m_actual, std::pow(10.0, -power));
    const std::string text = likelyText(likely, m_asWritten, power);
    const auto times = static_cast<long long>(std::llround(std::pow(10.0, std::abs(power))));
    m_questions.push_back(
        {.kind = power % 3 == 0 ? SlipKind::kUnit : SlipKind::kDecimalSign,
         .what = power > 0 ? fmt::format("{} is about {} times the target of {}",
                                         written(m_actual, m_asWritten), times, shownOf(target))
                           : fmt::format("{} is about 1/{} of the target of {}",
                                         written(m_actual, m_asWritten), times, shownOf(target)),
         .ask = fmt::format("did you mean {}?", text),
         .likely = likely,
         .likelyText = text});
  }

  const charge::ComponentPlan& m_plan;
  const charge::ComponentCharge& m_target;
  const Recorded& m_actual;
  std::string_view m_asWritten;
  std::vector<SlipQuestion> m_questions;
};

}  // namespace

std::vector<SlipQuestion> questionWeighing(const charge::ComponentPlan& plan,
                                           const charge::ComponentCharge& target,
                                           const Recorded& actual, std::string_view asWritten) {
  return Questioner(plan, target, actual, asWritten).run();
}

}  // namespace vialkeeper::app
