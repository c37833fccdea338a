// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/reading_plot.h"

#include <QCoreApplication>
#include <array>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr std::size_t kMostMarked = 200;

QString tr(const char* text) { return QCoreApplication::translate("ReadingPlot", text); }

PlotSeries seriesOf(const ReadingCurve& curve, const QString& name, const QColor& ink) {
  return {.name = name,
          .colour = ink,
          .look = PlotSeries::Look::kLineAndPoints,
          .x = curve.x_h,
          .y = curve.y};
}

}  // namespace

PlotContent readingPlot(const ReadingSeries& readings) {
  PlotContent content;
  content.xTitle =
      readings.axis == ReadingAxis::kClock ? tr("h since the beginning") : tr("h of lamp-on time");
  content.yTitle = tr("bar gauge");
  content.series.push_back(seriesOf(readings.pressure, tr("pressure"), colour("hydrogen")));
  if (!readings.temperature.x_h.empty()) {
    content.rightTitle = tr("°C");
    content.series.push_back(seriesOf(readings.temperature, tr("temperature"), colour("quiet")));
    content.series.back().onRight = true;
    content.series.back().look = PlotSeries::Look::kPoints;
  }
  for (const auto& [from, to] : readings.lampOn_h)
    content.spans.push_back({from, to, colour("noticeFill"), tr("lamp on")});
  if (readings.limit_bar)
    content.lines.push_back({PlotLine::Across::kHorizontal, *readings.limit_bar, colour("limit"),
                             tr("limit %1 bar").arg(*readings.limit_bar, 0, 'f', 2)});
  for (const ReadingSeries::Opening& opening : readings.openings)
    content.lines.push_back(
        {PlotLine::Across::kVertical, opening.x_h, colour("limit"), opening.word});
  return content;
}

PlotContent datasetPlot(const EvidenceContent& evidence) {
  PlotContent content;
  const std::vector<DatasetCurve> curves = curvesOf(evidence);
  if (curves.empty()) return content;
  content.xTitle = titleOf(evidence.item.dataset->columns.front());
  // Curves are told apart by their dashes and markers too.
  constexpr std::array kInks{"hydrogen", "limit", "closed", "lamp", "quiet", "text"};
  constexpr std::array kLooks{PlotSeries::Look::kLine, PlotSeries::Look::kDashed};
  for (std::size_t i = 0; i < curves.size(); ++i) {
    PlotSeries series{.name = curves[i].name,
                      .colour = colour(kInks[i % kInks.size()]),
                      .look = kLooks[i % kLooks.size()],
                      .x = curves[i].x,
                      .y = curves[i].y};
    if (series.look == PlotSeries::Look::kLine && series.x.size() <= kMostMarked)
      series.look = PlotSeries::Look::kLineAndPoints;
    content.series.push_back(std::move(series));
  }
  if (curves.size() == 1) content.yTitle = curves.front().name;
  return content;
}

}  // namespace vialkeeper::ui
