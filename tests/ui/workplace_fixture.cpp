// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/workplace_fixture.h"

#include <catch2/catch.hpp>
#include <filesystem>

#include "app/notebook/demo_campaign.h"
#include "app/notebook/run_plan.h"
#include "db/sqlite_notebook.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::tests {
namespace {

constexpr std::int64_t kStart_ms = 1772611200000;  // 2026-03-04T08:00:00Z

/// The demo's file of this process; it lies in a scratch folder of its own until the end.
const std::string& sharedDemo() {
  static const ScratchFolder folder;
  static const std::string file = [] {
    const std::string path = folder.path("demo.vialbook");
    auto notebook = db::createNotebook(path);
    REQUIRE(notebook);
    REQUIRE(app::makeDemo(**notebook, {}));
    return path;
  }();
  return file;
}

}  // namespace

units::Moment SetClock::now() {
  ++m_ms;
  return {std::chrono::sys_time<std::chrono::milliseconds>(
              std::chrono::milliseconds(kStart_ms + m_ms)),
          std::chrono::minutes(60)};
}

void SetClock::advance(std::chrono::milliseconds by) { m_ms += by.count(); }

WorkplaceFixture::WorkplaceFixture() = default;

QString WorkplaceFixture::bookFile() const { return ui::toQt(m_folder.path("book.vialbook")); }

std::unique_ptr<ui::NotebookLink> WorkplaceFixture::link(const QString& person) {
  const std::string file = bookFile().toStdString();
  auto notebook = std::filesystem::exists(file)
                      ? m_files.open(file, ui::NotebookFiles::Use::kWriting)
                      : m_files.create(file);
  REQUIRE(notebook);
  return std::make_unique<ui::NotebookLink>(workplace(), *std::move(notebook), bookFile(), person);
}

std::unique_ptr<app::Notebook> WorkplaceFixture::other() {
  auto notebook = m_files.open(bookFile().toStdString(), ui::NotebookFiles::Use::kWriting);
  REQUIRE(notebook);
  return *std::move(notebook);
}

app::RowNumber WorkplaceFixture::addRun(ui::NotebookLink& link, const std::string& name) {
  const std::string file =
      std::string(VIALKEEPER_SOURCE_DIR) + "/templates/runs/" + name + ".toml";
  // Set up well before: what tests log may have happened earlier than now.
  constexpr std::chrono::hours kBefore(120);
  m_clock.advance(-kBefore);
  const auto added =
      app::addRun(link.desk(), {.planText = bytesOf(file), .planFile = name + ".toml"});
  m_clock.advance(kBefore);
  if (!added) FAIL(ui::toUtf8(ui::sentences(added.error())));
  link.lookForChanges();
  return added->run.n;
}

QString WorkplaceFixture::demoFile() {
  const std::string copy = m_folder.path("demo.vialbook");
  std::filesystem::copy_file(sharedDemo(), copy,
                             std::filesystem::copy_options::overwrite_existing);
  return ui::toQt(copy);
}

void requireDone(const ui::Outcome& outcome) {
  INFO(ui::toUtf8(ui::sentences(outcome.faults)));
  REQUIRE(outcome.done);
}

}  // namespace vialkeeper::tests
