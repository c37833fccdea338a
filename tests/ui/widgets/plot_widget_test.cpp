// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_widget.h"

#include <QAbstractScrollArea>
#include <QElapsedTimer>
#include <QRegularExpression>
#include <QSignalSpy>
#include <QTest>
#include <catch2/catch.hpp>
#include <cmath>
#include <limits>
#include <random>

#include "ui/charts/plot_decimation.h"
#include "ui/charts/plot_scale.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

constexpr double kNan = std::numeric_limits<double>::quiet_NaN();

/// A noisy trace with one peak that a screen has no pixel for.
ui::PlotSeries trace(std::size_t points) {
  ui::PlotSeries series{.name = QStringLiteral("pressure"), .colour = Qt::blue};
  std::mt19937 random(7);
  std::normal_distribution<double> noise(0.0, 0.001);
  for (std::size_t i = 0; i < points; ++i) {
    series.x.push_back(static_cast<double>(i) / static_cast<double>(points) * 20.0);
    series.y.push_back(1.0 - std::exp(-series.x.back() / 5.0) + noise(random));
  }
  series.y[points / 3] = 5.0;
  return series;
}

ui::PlotContent contentOf(ui::PlotSeries series) {
  ui::PlotContent content{.xTitle = QStringLiteral("h"), .yTitle = QStringLiteral("bar")};
  content.series.push_back(std::move(series));
  return content;
}

}  // namespace

TEST_CASE("at most four points are kept of a column, and no peak is lost", "[ui][identity]") {
  const ui::PlotSeries series = trace(200'000);
  constexpr int kColumns = 800;
  const auto points = ui::decimated(series.x, series.y, 0.0, 20.0, kColumns);
  // One column more on either side: the line runs on to the edge.
  CHECK(points.size() <= 4 * (kColumns + 3));
  CHECK(ui::extentOf(points, 0.0, 20.0)->second == 5.0);
  CHECK(std::ranges::is_sorted(points, {}, [](const QPointF& at) { return at.x(); }));
  CHECK(points.front() == QPointF(series.x.front(), series.y.front()));
  CHECK(points.back() == QPointF(series.x.back(), series.y.back()));
  // Close up nothing is left out.
  const auto close = ui::decimated(series.x, series.y, 5.0, 5.1, kColumns);
  const auto [begin, end] = ui::placesInView(series.x, 5.0, 5.1);
  CHECK(static_cast<std::size_t>(close.size()) == end - begin);
}

TEST_CASE("a gap stays a gap however many points lie round it", "[ui][identity]") {
  ui::PlotSeries series = trace(100'000);
  for (std::size_t i = 40'000; i < 60'000; ++i) series.y[i] = kNan;
  const auto points = ui::decimated(series.x, series.y, 0.0, 20.0, 500);
  CHECK(std::ranges::count_if(points, [](const QPointF& at) { return std::isnan(at.y()); }) == 1);
  const auto line = ui::clippedLine(points, QRectF(QPointF(0, -1), QPointF(20, 10)));
  CHECK(std::ranges::count_if(line, [](const QPointF& at) { return std::isnan(at.y()); }) == 1);
}

TEST_CASE("a clipped line has no point outside and meets the edges", "[ui][identity]") {
  const QList<QPointF> line{{-1, -1}, {1, 1}, {3, 5}, {5, 1}, {9, 1}};
  const QRectF inside(QPointF(0, 0), QPointF(6, 4));
  const auto clipped = ui::clippedLine(line, inside);
  for (const QPointF& at : clipped) {
    if (std::isnan(at.y())) continue;
    CHECK(at.x() >= -1e-12);
    CHECK(at.x() <= 6 + 1e-12);
    CHECK(at.y() >= -1e-12);
    CHECK(at.y() <= 4 + 1e-12);
  }
  CHECK(clipped.front() == QPointF(0, 0));
  CHECK(clipped.back() == QPointF(6, 1));
  CHECK(ui::clippedLine({}, inside).isEmpty());
  CHECK(ui::clippedLine({{1, kNan}, {2, kNan}}, inside).isEmpty());
}

TEST_CASE("steps of an axis are 1, 2 or 5 times a power of ten", "[ui][identity]") {
  CHECK(ui::niceStep(20.0, 5) == Approx(5.0));
  CHECK(ui::niceStep(0.9, 6) == Approx(0.2));
  CHECK(ui::niceStep(7e-4, 5) == Approx(2e-4));
  CHECK(ui::niceStep(0.0, 5) == 1.0);
  CHECK(ui::niceStep(kNan, 5) == 1.0);
  CHECK(ui::roomyRange(std::nullopt) == std::pair(0.0, 1.0));
  CHECK(ui::roomyRange(std::pair(3.0, 3.0)).first < 3.0);
}

TEST_CASE("the view is moved and zoomed by keys and stays within the data", "[ui][identity]") {
  ui::PlotWidget plot;
  plot.resize(600, 300);
  plot.setContent(contentOf(trace(1000)), true);
  plot.setVisible(true);
  plot.setFocus();
  const auto all = plot.xView();
  QTest::keyClick(&plot, Qt::Key_Plus);
  const auto zoomed = plot.xView();
  CHECK(zoomed.second - zoomed.first == Approx(0.8 * (all.second - all.first)));
  for (int i = 0; i < 50; ++i) QTest::keyClick(&plot, Qt::Key_Right);
  CHECK(plot.xView().second == Approx(all.second));
  for (int i = 0; i < 50; ++i) QTest::keyClick(&plot, Qt::Key_Left);
  CHECK(plot.xView().first == Approx(all.first));
  // Data that grow leave a zoomed view alone; a view of all follows.
  plot.setContent(contentOf(trace(2000)));
  CHECK(plot.xView().second - plot.xView().first == Approx(zoomed.second - zoomed.first));
  QTest::keyClick(&plot, Qt::Key_0);
  CHECK(plot.xView().first == all.first);
  for (int i = 0; i < 200; ++i) QTest::keyClick(&plot, Qt::Key_Plus);
  CHECK(plot.xView().first < plot.xView().second);
}

TEST_CASE("a plot of nothing, of one point and of gaps alone is drawn", "[ui][identity]") {
  ui::PlotWidget plot;
  plot.resize(400, 200);
  plot.setVisible(true);
  plot.setContent({}, true);
  CHECK_FALSE(plot.grab().isNull());
  for (const auto& series :
       {ui::PlotSeries{.look = ui::PlotSeries::Look::kLineAndPoints, .x = {1.0}, .y = {2.0}},
        ui::PlotSeries{.x = {1.0, 2.0}, .y = {kNan, kNan}},
        ui::PlotSeries{.x = {1.0, 1.0}, .y = {1.0, 1.0}}}) {
    plot.setContent(contentOf(series), true);
    CHECK_FALSE(plot.grab().isNull());
    CHECK(plot.svg().contains("<svg"));
  }
}

TEST_CASE("an SVG of a zoomed plot holds no coordinate outside its picture", "[ui][identity]") {
  ui::PlotWidget plot;
  plot.resize(600, 300);
  ui::PlotContent content = contentOf(trace(5000));
  content.spans.push_back({-5.0, 50.0, Qt::yellow, QStringLiteral("lamp on")});
  content.lines.push_back(
      {ui::PlotLine::Across::kHorizontal, 0.5, Qt::red, QStringLiteral("limit")});
  content.yRange = {0.2, 0.9};
  plot.setContent(content, true);
  plot.setVisible(true);
  QTest::qWait(20);
  plot.setXView(4.0, 9.0);
  const QString svg = QString::fromUtf8(plot.svg());
  static const QRegularExpression kLine(
      QStringLiteral("<poly(?:line|gon)[^>]*points=\"([^\"]*)\""));
  static const QRegularExpression kPath(QStringLiteral("<path[^>]* d=\"([^\"]*)\""));
  static const QRegularExpression kPair(QStringLiteral("(-?[0-9.]+),(-?[0-9.]+)"));
  int seen = 0;
  for (const auto& shape : {kLine, kPath}) {
    for (auto each = shape.globalMatch(svg); each.hasNext();) {
      for (auto pair = kPair.globalMatch(each.next().captured(1)); pair.hasNext();) {
        const auto found = pair.next();
        ++seen;
        CHECK(found.captured(1).toDouble() > -5.0);
        CHECK(found.captured(1).toDouble() < 605.0);
        CHECK(found.captured(2).toDouble() > -5.0);
        CHECK(found.captured(2).toDouble() < 305.0);
      }
    }
  }
  CHECK(seen > 100);
}

TEST_CASE("a picture is written whole, as PNG or SVG by its name", "[ui][identity]") {
  tests::WorkplaceFixture fixture;
  ui::PlotWidget plot;
  plot.resize(300, 200);
  plot.setContent(contentOf(trace(100)), true);
  const std::string png = fixture.folder().path("chart.png");
  const std::string svg = fixture.folder().path("chart.svg");
  REQUIRE(plot.savePicture(QString::fromStdString(png)));
  REQUIRE(plot.savePicture(QString::fromStdString(svg)));
  CHECK(tests::bytesOf(png).substr(1, 3) == "PNG");
  CHECK(tests::bytesOf(svg).find("<svg") != std::string::npos);
  CHECK_FALSE(plot.savePicture(QStringLiteral("/nowhere/chart.png")));
}

TEST_CASE("a click on a point tells its place in the series", "[ui][identity]") {
  ui::PlotWidget plot;
  plot.resize(500, 300);
  ui::PlotSeries series{.look = ui::PlotSeries::Look::kLineAndPoints};
  series.x = {0.0, 1.0, 2.0};
  series.y = {0.0, 1.0, 2.0};
  plot.setContent(contentOf(series), true);
  plot.setVisible(true);
  QTest::qWait(30);
  QSignalSpy clicked(&plot, &ui::PlotWidget::pointClicked);
  auto* view = plot.findChild<QAbstractScrollArea*>()->viewport();
  REQUIRE(view != nullptr);
  for (int y = 5; y < view->height() && clicked.isEmpty(); y += 6)
    for (int x = view->width() / 2 - 20; x < view->width() / 2 + 60 && clicked.isEmpty(); x += 6)
      QTest::mouseClick(view, Qt::LeftButton, {}, {x, y});
  REQUIRE(clicked.size() == 1);
  CHECK(clicked.front().at(1).toInt() == 1);
}

TEST_CASE("a million points pan and zoom within a frame", "[.bench][ui]") {
  ui::PlotWidget plot;
  plot.resize(1200, 700);
  plot.setContent(contentOf(trace(1'000'000)), true);
  plot.setVisible(true);
  QTest::qWait(100);
  QElapsedTimer clock;
  constexpr int kFrames = 40;
  clock.start();
  for (int i = 0; i < kFrames; ++i) plot.setXView(0.01 * i, 10.0 + 0.01 * i);
  WARN("view: " << static_cast<double>(clock.nsecsElapsed()) / 1e6 / kFrames << " ms a frame");
  clock.restart();
  for (int i = 0; i < kFrames; ++i) {
    plot.setXView(0.01 * i, 19.0 + 0.01 * i);
    plot.grab();
  }
  WARN("view and picture: " << static_cast<double>(clock.nsecsElapsed()) / 1e6 / kFrames
                            << " ms a frame");
}
