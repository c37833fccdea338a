// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/text_files.h"

#include <sys/resource.h>
#include <sys/stat.h>
#include <unistd.h>

#include <catch2/catch.hpp>
#include <csignal>

#include "support/scratch_folder.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;
using app::readFile;
using app::writeFile;

namespace {

template <class Result>
text::Fault onlyFault(const Result& result) {
  REQUIRE(!result);
  REQUIRE(result.error().size() == 1);
  return result.error().front();
}

/// Lets no file of this process grow beyond some bytes, as a full disk would; for the life of the
/// object.
class FileSizeLimit {
 public:
  explicit FileSizeLimit(rlim_t bytes) {
    m_oldHandler = std::signal(SIGXFSZ, SIG_IGN);  // so that write fails in place of the process
    ::getrlimit(RLIMIT_FSIZE, &m_old);
    const rlimit limit{bytes, m_old.rlim_max};
    ::setrlimit(RLIMIT_FSIZE, &limit);
  }
  ~FileSizeLimit() {
    ::setrlimit(RLIMIT_FSIZE, &m_old);
    std::signal(SIGXFSZ, m_oldHandler);
  }
  FileSizeLimit(const FileSizeLimit&) = delete;
  FileSizeLimit& operator=(const FileSizeLimit&) = delete;

 private:
  rlimit m_old{};
  void (*m_oldHandler)(int) = SIG_DFL;
};

}  // namespace

TEST_CASE("a file is read byte for byte, large and empty ones too", "[app][files][identity]") {
  const ScratchFolder folder;
  std::string bytes("one\r\n\0two\xFF", 10);
  CHECK(readFile(folder.write("a", bytes)).value() == bytes);
  CHECK(readFile(folder.write("empty", "")).value().empty());
  const std::string large(300'000, 'x');  // more than one block
  CHECK(readFile(folder.write("large", large)).value() == large);
}

TEST_CASE("a file that cannot be read is told with its path", "[app][files]") {
  const ScratchFolder folder;
  folder.makeFolder("runs");
  const auto missing = onlyFault(readFile(folder.path("nowhere")));
  CHECK(missing.file == folder.path("nowhere"));
  CHECK(missing.what == "there is no such file");
  CHECK(missing.kind == text::FaultKind::kInput);
  CHECK(onlyFault(readFile(folder.path("runs"))).what == "this is a folder, not a file");
  folder.write("a", "a");
  CHECK(onlyFault(readFile(folder.path("a/b"))).what == "a part of the path is not a folder");
  CHECK(onlyFault(readFile("")).what == "there is no such file");
  if (::geteuid() != 0) {
    ::chmod(folder.path("a").c_str(), 0);
    CHECK(onlyFault(readFile(folder.path("a"))).what == "no permission to read the file");
  }
}

TEST_CASE("a file larger than 64 MiB is refused, an endless one too", "[app][files]") {
  CHECK(onlyFault(readFile("/dev/zero")).what == "the file is larger than 64 MiB");
}

TEST_CASE("what was written is read back, and nothing else is left", "[app][files][identity]") {
  const ScratchFolder folder;
  const std::string bytes("first\0\xFF\n", 8);
  REQUIRE(writeFile(folder.path("a"), bytes));
  CHECK(readFile(folder.path("a")).value() == bytes);
  REQUIRE(writeFile(folder.path("a"), "second"));
  CHECK(readFile(folder.path("a")).value() == "second");
  REQUIRE(writeFile(folder.path("a"), ""));
  CHECK(readFile(folder.path("a")).value().empty());
  CHECK(folder.contents().size() == 1);
}

TEST_CASE("a write that cannot begin leaves all as it was", "[app][files]") {
  const ScratchFolder folder;
  folder.makeFolder("runs");
  folder.write("a", "old");
  const auto before = folder.contents();
  CHECK(onlyFault(writeFile(folder.path("nowhere/a"), "new")).what == "the folder does not exist");
  CHECK(onlyFault(writeFile(folder.path("runs"), "new")).what == "this is a folder, not a file");
  CHECK(onlyFault(writeFile(folder.path("a/b"), "new")).what ==
        "a part of the path is not a folder");
  CHECK(onlyFault(writeFile("", "new")).kind == text::FaultKind::kInput);
  CHECK(folder.contents() == before);
}

TEST_CASE("a folder that may not be written to keeps its file", "[app][files]") {
  if (::geteuid() == 0) return;  // nothing is closed to root
  const ScratchFolder folder;
  folder.makeFolder("closed");
  folder.write("closed/a", "old");
  ::chmod(folder.path("closed").c_str(), 0500);
  CHECK(onlyFault(writeFile(folder.path("closed/a"), "new")).what == "no permission to write here");
  CHECK(readFile(folder.path("closed/a")).value() == "old");
  ::chmod(folder.path("closed").c_str(), 0700);
}

TEST_CASE("a write that breaks off leaves the old file and no rest", "[app][files]") {
  const ScratchFolder folder;
  folder.write("a", "old");
  const auto before = folder.contents();
  {
    const FileSizeLimit limit(1000);
    const auto fault = onlyFault(writeFile(folder.path("a"), std::string(5000, 'x')));
    CHECK(fault.file == folder.path("a"));
    CHECK(!fault.what.empty());
    CHECK(!fault.mend.empty());
  }
  CHECK(folder.contents() == before);
}

TEST_CASE("a temporary file of an earlier, killed write is never overwritten", "[app][files]") {
  const ScratchFolder folder;
  const std::string rest = folder.write("a.part-" + std::to_string(::getpid()), "someone else's");
  const auto written = writeFile(folder.path("a"), "new");
  if (!written) CHECK(!written.error().front().what.empty());
  CHECK(bytesOf(rest) == "someone else's");
}
