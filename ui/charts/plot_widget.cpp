// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_widget.h"

#include <QBuffer>
#include <QContextMenuEvent>
#include <QFileDialog>
#include <QKeyEvent>
#include <QMenu>
#include <QMouseEvent>
#include <QPainter>
#include <QSvgGenerator>
#include <QToolTip>
#include <QVBoxLayout>
#include <QWheelEvent>
#include <algorithm>
#include <cmath>

#include "app/text_files.h"
#include "ui/charts/plot_chart.h"
#include "ui/charts/plot_scale.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr double kZoomStep = 0.8;
constexpr double kPanStep = 0.1;
constexpr double kLeastShare = 1e-6;  // of all that there is
constexpr double kDragThreshold_px = 4.0;
constexpr int kFocusFrame_px = 2;
constexpr int kSvgResolution_dpi = 96;

/// Whether two contents differ in their numbers alone.
bool looksAlike(const PlotContent& a, const PlotContent& b) {
  return a.xTitle == b.xTitle && a.yTitle == b.yTitle && a.rightTitle == b.rightTitle &&
         std::ranges::equal(a.series, b.series, [](const PlotSeries& one, const PlotSeries& other) {
           return one.name == other.name && one.colour == other.colour && one.look == other.look &&
                  one.onRight == other.onRight;
         });
}

}  // namespace

PlotWidget::PlotWidget(QWidget* parent) : QWidget(parent), m_chart(std::make_unique<Chart>(*this)) {
  setFocusPolicy(Qt::StrongFocus);
  setAccessibleName(tr("Chart"));
  setToolTip(tr("Drag or arrow keys: along the axis. Wheel, + and −: closer and farther. 0: all."));
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(kFocusFrame_px, kFocusFrame_px, kFocusFrame_px, kFocusFrame_px);
  column->addWidget(&m_chart->chartView());
  column->activate();
  m_chart->chartView().viewport()->installEventFilter(this);
  m_chart->chartView().setFocusProxy(this);
  connect(&Theme::instance(), &Theme::changed, this, [this] { m_chart->rebuild(); });
}

PlotWidget::~PlotWidget() = default;

void PlotWidget::setContent(PlotContent content, bool showAll) {
  const bool sameLook = looksAlike(m_chart->content, content);
  m_chart->content = std::move(content);
  if (showAll) m_chart->view.reset();
  // What only grew needs no new series: readings that come in ten times a second are cheap.
  if (sameLook)
    m_chart->refresh();
  else
    m_chart->rebuild();
  setAccessibleDescription(m_chart->description());
}

const PlotContent& PlotWidget::content() const { return m_chart->content; }

void PlotWidget::showAll() {
  m_chart->view.reset();
  m_chart->refresh();
}

std::pair<double, double> PlotWidget::xView() const { return m_chart->inView(); }

void PlotWidget::setXView(double from, double to) {
  const auto all = m_chart->all();
  const double least = kLeastShare * (all.second - all.first);
  if (!(to - from > least)) return;
  const auto view = within({from, to}, all);
  if (view == all)
    m_chart->view.reset();
  else
    m_chart->view = view;
  m_chart->refresh();
}

void PlotWidget::zoom(double factor, double around) {
  const auto [from, to] = xView();
  setXView(around - (around - from) * factor, around + (to - around) * factor);
}

void PlotWidget::pan(double share) {
  const auto [from, to] = xView();
  const double by = share * (to - from);
  setXView(from + by, to + by);
}

void PlotWidget::changeEvent(QEvent* event) {
  QWidget::changeEvent(event);
  if (event->type() == QEvent::FontChange) m_chart->rebuild();
}

void PlotWidget::paintEvent(QPaintEvent*) {
  if (!hasFocus()) return;
  QPainter painter(this);
  painter.setPen(QPen(colour("focus"), kFocusFrame_px));
  painter.drawRect(QRectF(rect()).adjusted(1, 1, -1, -1));
}

void PlotWidget::focusInEvent(QFocusEvent* event) {
  QWidget::focusInEvent(event);
  update();
}

void PlotWidget::focusOutEvent(QFocusEvent* event) {
  QWidget::focusOutEvent(event);
  update();
}

void PlotWidget::keyPressEvent(QKeyEvent* event) {
  const auto [from, to] = xView();
  const double middle = (from + to) / 2.0;
  switch (event->key()) {
    case Qt::Key_Left:
      return pan(-kPanStep);
    case Qt::Key_Right:
      return pan(kPanStep);
    case Qt::Key_Plus:
    case Qt::Key_Equal:
      return zoom(kZoomStep, middle);
    case Qt::Key_Minus:
      return zoom(1.0 / kZoomStep, middle);
    case Qt::Key_0:
      return showAll();
    default:
      QWidget::keyPressEvent(event);
  }
}

void PlotWidget::contextMenuEvent(QContextMenuEvent* event) {
  auto* menu = new QMenu(this);
  menu->setAttribute(Qt::WA_DeleteOnClose);
  menu->addAction(tr("Show all"), this, &PlotWidget::showAll);
  menu->addAction(tr("Save the picture…"), this, &PlotWidget::choosePictureFile);
  menu->popup(event->globalPos());
}

void PlotWidget::tellClick(const QPointF& at) {
  if (const auto point = m_chart->pointAt(at)) emit pointClicked(point->first, point->second);
}

bool PlotWidget::eventFilter(QObject* watched, QEvent* event) {
  if (watched != m_chart->chartView().viewport()) return QWidget::eventFilter(watched, event);
  const PlotFrame& frame = m_chart->frame();
  const double perPixel = (frame.x.second - frame.x.first) / std::max(frame.area.width(), 1.0);
  switch (event->type()) {
    case QEvent::Wheel: {
      auto* wheel = static_cast<QWheelEvent*>(event);
      if (wheel->angleDelta().y() == 0) return false;
      const double steps = wheel->angleDelta().y() / 120.0;
      zoom(std::pow(kZoomStep, steps),
           frame.x.first + (wheel->position().x() - frame.area.left()) * perPixel);
      event->accept();
      return true;
    }
    case QEvent::MouseButtonPress: {
      auto* mouse = static_cast<QMouseEvent*>(event);
      if (mouse->button() != Qt::LeftButton) return false;
      setFocus(Qt::MouseFocusReason);
      m_draggedFrom = mouse->position().x();
      m_viewBefore = xView();
      m_moved = false;
      return true;
    }
    case QEvent::MouseMove: {
      if (!m_draggedFrom) return false;
      const double moved = static_cast<QMouseEvent*>(event)->position().x() - *m_draggedFrom;
      m_moved = m_moved || std::abs(moved) > kDragThreshold_px;
      if (m_moved)
        setXView(m_viewBefore.first - moved * perPixel, m_viewBefore.second - moved * perPixel);
      return true;
    }
    case QEvent::MouseButtonRelease:
      if (m_draggedFrom && !m_moved) tellClick(static_cast<QMouseEvent*>(event)->position());
      m_draggedFrom.reset();
      return true;
    case QEvent::MouseButtonDblClick:
      showAll();
      return true;
    default:
      return QWidget::eventFilter(watched, event);
  }
}

QImage PlotWidget::picture(double scale) const {
  m_chart->settle();
  const QSize size = m_chart->chartView().size();
  QImage image(size * scale, QImage::Format_ARGB32_Premultiplied);
  image.setDevicePixelRatio(scale);
  image.fill(colour("panel"));
  QPainter painter(&image);
  painter.setRenderHint(QPainter::Antialiasing);
  m_chart->render(painter, QRectF(QPointF(), QSizeF(size)));
  return image;
}

QByteArray PlotWidget::svg() const {
  m_chart->settle();
  const QSize size = m_chart->chartView().size();
  QBuffer buffer;
  buffer.open(QIODevice::WriteOnly);
  QSvgGenerator generator;
  generator.setOutputDevice(&buffer);
  generator.setResolution(kSvgResolution_dpi);
  generator.setSize(size);
  generator.setViewBox(QRect(QPoint(), size));
  generator.setTitle(accessibleName());
  generator.setDescription(accessibleDescription());
  {
    QPainter painter(&generator);
    m_chart->render(painter, QRectF(QPointF(), QSizeF(size)));
  }
  return buffer.data();
}

text::Checked<void> PlotWidget::savePicture(const QString& file) const {
  QByteArray bytes;
  if (file.endsWith(QStringLiteral(".svg"), Qt::CaseInsensitive)) {
    bytes = svg();
  } else {
    QBuffer buffer(&bytes);
    buffer.open(QIODevice::WriteOnly);
    picture().save(&buffer, "PNG");
  }
  return app::writeFile(toUtf8(file), bytes.toStdString());
}

void PlotWidget::choosePictureFile() {
  const QString file = QFileDialog::getSaveFileName(this, tr("Save the picture"), {},
                                                    tr("PNG picture (*.png);;SVG drawing (*.svg)"));
  if (file.isEmpty()) return;
  if (const auto saved = savePicture(file); !saved)
    emit refused(saved.error());
  else
    emit pictureSaved(file);
}

}  // namespace vialkeeper::ui
