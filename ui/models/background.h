// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QCoreApplication>
#include <QPointer>
#include <QThreadPool>
#include <memory>
#include <utility>

namespace vialkeeper::ui {

/// Does `work` in another thread and hands what it gives to `done` in the thread of `context`; if
/// `context` has gone by then, nothing is handed on. `work` must not touch anything of the caller's.
template <class Work, class Done>
void inBackground(QObject* context, Work work, Done done) {
  QThreadPool::globalInstance()->start(
      [guard = QPointer<QObject>(context), work = std::move(work),
       done = std::move(done)]() mutable {
        auto result = std::make_shared<decltype(work())>(work());
        QMetaObject::invokeMethod(
            QCoreApplication::instance(),
            [guard, result, done = std::move(done)]() mutable {
              if (guard) done(std::move(*result));
            },
            Qt::QueuedConnection);
      });
}

}  // namespace vialkeeper::ui
