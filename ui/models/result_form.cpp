// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/result_form.h"

#include <fmt/format.h>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

app::Deed deedOf(ResultForm::Field field) {
  switch (field) {
    case ResultForm::Field::kTitle:
    case ResultForm::Field::kAim:
      return app::Deed::kWriteHeadings;
    case ResultForm::Field::kConclusion:
      return app::Deed::kConclude;
    case ResultForm::Field::kYield:
    case ResultForm::Field::kConversion:
      break;
  }
  return app::Deed::kRecordResult;
}

QString percentText(const std::optional<double>& value, const std::optional<double>& u) {
  if (!value) return {};
  return toQt(u ? fmt::format("{} ± {} %", *value, *u) : fmt::format("{} %", *value));
}

}  // namespace

ResultForm::ResultForm(OpenRun& run, QObject* parent) : QObject(parent), m_run(run) {
  connect(&m_run, &OpenRun::reloaded, this, &ResultForm::changed);
}

QString ResultForm::text(Field field) const {
  if (!m_run.isOpen()) return {};
  const app::RunRecord& run = m_run.run();
  switch (field) {
    case Field::kTitle:
      return toQt(run.title);
    case Field::kAim:
      return toQt(run.aim);
    case Field::kYield:
      return percentText(run.yield_percent, run.uYield_percent);
    case Field::kConversion:
      return percentText(run.conversion_percent, run.uConversion_percent);
    case Field::kConclusion:
      break;
  }
  return toQt(run.conclusion);
}

QString ResultForm::refusal(Field field) const { return m_run.refusal(deedOf(field)); }

Outcome ResultForm::commit(Field field, const QString& typed) {
  if (!m_run.isOpen() || typed == text(field)) return Outcome::success();
  app::ResultRequest request;
  const std::string words = toUtf8(typed);
  switch (field) {
    case Field::kTitle:
      request.title = words;
      break;
    case Field::kAim:
      request.aim = words;
      break;
    case Field::kYield:
      request.yield = words;
      break;
    case Field::kConversion:
      request.conversion = words;
      break;
    case Field::kConclusion:
      request.conclusion = words;
      break;
  }
  return m_run.record(request);
}

std::vector<ResultForm::Move> ResultForm::moves() const {
  std::vector<Move> moves;
  if (!m_run.isOpen() || m_run.link().isReadOnly()) return moves;
  for (const app::Transition& each : app::kTransitions) {
    // A seal is a signature, not a step by hand.
    if (each.from == m_run.run().state && each.to != app::RunState::kSealed)
      moves.push_back({each.to, each.permission == app::Permission::kWithReason});
  }
  return moves;
}

Outcome ResultForm::moveTo(app::RunState state, const QString& reason) {
  app::ResultRequest request;
  request.state = std::string(toText(state));
  request.reason = toUtf8(reason);
  return m_run.record(request);
}

}  // namespace vialkeeper::ui
