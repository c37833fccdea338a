// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/strip_view.h"

#include <QCoreApplication>
#include <algorithm>
#include <array>
#include <cmath>

#include "app/notebook/log_line_kinds.h"
#include "ui/models/moment_text.h"
#include "ui/models/qt_text.h"
#include "units/shown.h"

namespace vialkeeper::ui {
namespace {

constexpr std::size_t kLatest = 3;
constexpr double kMostTicks = 6.0;
// A gauge without a limit shows this much, or the reading with room above it.
constexpr double kPlainGauge_bar = 1.0;
constexpr double kRoomAbove = 1.25;

QString tr(const char* text) { return QCoreApplication::translate("Strip", text); }

QString figure(double value) { return QString::number(value, 'g', 6); }
QString mL(units::Volume volume) { return QString::number(volume.millilitres(), 'g', 3); }

VialView vialView(const app::VialFilling& filling) {
  VialView view;
  view.filled = std::clamp((filling.liquid + filling.displaced) / filling.vial, 0.0, 1.0);
  view.hasStirBar = filling.displaced.si() > 0.0;
  view.words = tr("%1 mL liquid in a vial of %2 mL, %3 mL headspace")
                   .arg(mL(filling.liquid), mL(filling.vial), mL(filling.headspace));
  return view;
}

GaugeView gaugeView(const app::VialStrip& strip) {
  GaugeView view;
  const double reading_bar = strip.pressureGauge_bar.value_or(0.0);
  const double top_bar =
      kRoomAbove * std::max(strip.limit_bar.value_or(kPlainGauge_bar), reading_bar);
  if (strip.limit_bar) {
    view.limit = *strip.limit_bar / top_bar;
    view.limitWords = tr("limit %1 bar").arg(*strip.limit_bar, 0, 'f', 2);
    view.overLimit = strip.pressureGauge_bar && reading_bar > *strip.limit_bar;
  } else {
    view.limitWords = tr("no limit known");
  }
  view.forecast = tr("no forecast yet");
  if (!strip.pressure) {
    view.value = tr("no reading");
    view.detail = tr("yet");
    return view;
  }
  if (strip.pressureGauge_bar) view.reading = std::clamp(reading_bar / top_bar, 0.0, 1.0);
  view.value = tr("%1 bar").arg(figure(strip.pressure->value));
  QStringList detail{toQt(strip.pressure->kind)};
  if (strip.temperature) detail += tr("%1 °C").arg(figure(strip.temperature->value));
  detail += clockText(strip.pressure->at);
  view.detail = detail.join(QStringLiteral(", "));
  return view;
}

LampView lampView(const app::VialStrip& strip) {
  LampView view{.isOn = strip.lampIsOn};
  const QString planned = strip.planned ? toQt(units::shown(*strip.planned)) : QString();
  const QString on = toQt(units::shown(strip.lampOn));
  if (strip.lamp.empty()) {
    view.clock =
        planned.isEmpty() ? tr("Lamp not on yet") : tr("Lamp not on yet, %1 planned").arg(planned);
  } else {
    view.clock = strip.lampIsOn ? tr("Lamp on %1").arg(on) : tr("Lamp off after %1").arg(on);
    if (!planned.isEmpty()) view.clock += tr(" of %1").arg(planned);
  }
  QStringList detail;
  if (!strip.light.empty()) detail += toQt(strip.light);
  if (strip.interruptions == 1) detail += tr("1 interruption");
  if (strip.interruptions > 1) detail += tr("%1 interruptions").arg(strip.interruptions);
  view.detail = detail.join(QStringLiteral(" · "));
  return view;
}

/// Hours between two ticks, as on a clock or calendar.
double hourStep(double span_h) {
  constexpr std::array kSteps{0.25, 0.5, 1.0, 2.0, 5.0, 10.0, 12.0, 24.0, 48.0, 120.0, 240.0};
  for (const double step : kSteps)
    if (span_h / step <= kMostTicks) return step;
  return std::pow(10.0, std::ceil(std::log10(span_h / kMostTicks)));
}

/// The line of time from its first mark to its last, with what is planned behind it. While the lamp
/// is out the line does not grow: an entry of last month stays in its place.
class TimelineMaker {
 public:
  explicit TimelineMaker(const app::VialStrip& strip) : m_strip(strip) {
    for (const app::TimelineMark& mark : strip.marks) take(mark.hours);
    for (const app::TimelineInterval& each : strip.lamp) take(each.to_h);
    if (strip.planned) m_rest_h = std::max(0.0, strip.planned->hours() - strip.lampOn.hours());
    m_past_h = m_to_h;
    // What the core says of the planned end counts; a run that is over has none.
    if (strip.end_h > m_past_h) m_to_h = std::min(strip.end_h, m_past_h + m_rest_h);
    if (m_to_h <= m_from_h) m_to_h = m_from_h + 1.0;
  }

  TimelineView make() const {
    TimelineView view;
    for (const app::TimelineInterval& each : m_strip.lamp)
      view.lamp.push_back({share(each.from_h), share(each.to_h), each.open});
    if (m_to_h > m_past_h && m_rest_h > 0.0)
      view.planned = TimelineView::Interval{share(m_past_h), 1.0, false};
    for (const app::TimelineMark& mark : m_strip.marks) view.marks.push_back(markOf(mark));
    addTicks(view);
    return view;
  }

 private:
  void take(double at_h) {
    m_from_h = std::min(m_from_h, at_h);
    m_to_h = std::max(m_to_h, at_h);
  }
  [[nodiscard]] double share(double at_h) const {
    return std::clamp((at_h - m_from_h) / (m_to_h - m_from_h), 0.0, 1.0);
  }
  [[nodiscard]] TimelineView::Mark markOf(const app::TimelineMark& mark) const {
    return {.entry = mark.entry,
            .at = share(mark.hours),
            .letter = toQt(mark.letter),
            .sentence = clockBeside(mark.at, m_strip.begin.value_or(mark.at)) + QLatin1Char(' ') +
                        toQt(mark.sentence),
            .removesGas = mark.kind == app::event_kind::kVent ||
                          mark.kind == app::event_kind::kPurge ||
                          mark.kind == app::event_kind::kGasSample};
  }
  void addTicks(TimelineView& view) const {
    const double step_h = hourStep(m_to_h - m_from_h);
    for (double at_h = 0.0; at_h <= m_to_h * (1.0 + 1e-9); at_h += step_h)
      view.ticks.push_back({share(at_h), figure(at_h)});
    if (!view.ticks.empty()) view.ticks.back().word += tr(" h");
  }

  const app::VialStrip& m_strip;
  double m_from_h = 0.0;
  double m_to_h = 0.0;
  double m_past_h = 0.0;
  double m_rest_h = 0.0;
};

}  // namespace

StripView stripView(const app::VialStrip& strip) {
  StripView view;
  if (strip.filling) view.vial = vialView(*strip.filling);
  view.gauge = gaugeView(strip);
  view.lamp = lampView(strip);
  view.timeline = TimelineMaker(strip).make();
  for (auto mark = strip.marks.rbegin(); mark != strip.marks.rend() && view.latest.size() < kLatest;
       ++mark)
    view.latest.push_back(clockText(mark->at) + QLatin1Char(' ') + toQt(mark->sentence));
  return view;
}

}  // namespace vialkeeper::ui
