// The test program's own main: after the checks it compares docs/verification.md with what they entered in the
// register, or writes it. (doctest is implemented here, so the main of test_support is not linked.)
#define DOCTEST_CONFIG_IMPLEMENT
#include <doctest/doctest.h>

#include <cstring>
#include <fstream>
#include <iostream>
#include <sstream>

#include "register.hpp"

namespace {

const std::string page_file = GROUNDSILL_SOURCE_DIR "/docs/verification.md";

int write_page() {
    std::ofstream file(page_file, std::ios::binary);
    file << published::verification_page();
    file.close();
    if (file) return 0;
    std::cerr << "cannot write " << page_file << "\n";
    return 1;
}

int compare_page() {
    std::ifstream file(page_file, std::ios::binary);
    std::ostringstream committed;
    committed << file.rdbuf();
    if (committed.str() == published::verification_page()) return 0;
    std::cerr << page_file << " is out of date: run this program with --write-verification\n";
    return 1;
}

/// Notes whether a run left test cases out: then the register is not the whole one.
struct Completeness : doctest::IReporter {
    static inline bool whole = false;

    explicit Completeness(const doctest::ContextOptions&) {}
    void test_run_end(const doctest::TestRunStats& run) override {
        whole = run.numTestCasesPassingFilters == run.numTestCases && run.numTestCases > 0;
    }
    void report_query(const doctest::QueryData&) override {}
    void test_run_start() override {}
    void test_case_start(const doctest::TestCaseData&) override {}
    void test_case_reenter(const doctest::TestCaseData&) override {}
    void test_case_end(const doctest::CurrentTestCaseStats&) override {}
    void test_case_exception(const doctest::TestCaseException&) override {}
    void subcase_start(const doctest::SubcaseSignature&) override {}
    void subcase_end() override {}
    void log_assert(const doctest::AssertData&) override {}
    void log_message(const doctest::MessageData&) override {}
    void test_case_skipped(const doctest::TestCaseData&) override {}
};

} // namespace

DOCTEST_REGISTER_LISTENER("completeness", 1, Completeness);

int main(int argc, char** argv) {
    bool write = false;
    for (int i = 1; i < argc; ++i) write = write || std::strcmp(argv[i], "--write-verification") == 0;

    doctest::Context context(argc, argv);
    const int failed = context.run();
    if (context.shouldExit() || failed != 0 || !Completeness::whole) return failed;
    return write ? write_page() : compare_page();
}
