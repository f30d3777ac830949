#include "run_model.hpp"

#include <cmath>
#include <stdexcept>

#include <doctest/doctest.h>
#include <fmt/format.h>
#include <nlohmann/json.hpp>

#include "groundsill/groundsill.hpp"

namespace test {

namespace {

using Json = nlohmann::ordered_json;

/// Ends the running test; doctest's FAIL throws, which the compiler cannot know.
[[noreturn]] void give_up(const std::string& message) {
    FAIL(message);
    throw std::logic_error(message);
}

std::string lines(const groundsill::Diagnostics& diagnostics) {
    std::string text;
    for (const groundsill::Diagnostic& d : diagnostics) {
        const bool error = d.severity == groundsill::Diagnostic::Severity::error;
        text +=
            fmt::format("{}:{}: {}: {}\n", d.position.line, d.position.column, error ? "error" : "warning", d.message);
    }
    return text;
}

groundsill::Model read(std::string_view toml) {
    groundsill::ReadResult result = groundsill::read_model(toml);
    if (!result.model) give_up(fmt::format("the model is refused:\n{}{}", lines(result.diagnostics), toml));
    return std::move(*result.model);
}

} // namespace

struct Result::Document {
    Json json;

    /// The value at a pointer, or nullptr.
    const Json* find(std::string_view pointer) const {
        const Json::json_pointer where{std::string(pointer)};
        return json.contains(where) ? &json.at(where) : nullptr;
    }
    const Json& at(std::string_view pointer) const {
        const Json* value = find(pointer);
        if (value == nullptr) give_up(fmt::format("the results hold no {}", pointer));
        return *value;
    }
};

Result::Result(const std::string& json) {
    Json parsed = Json::parse(json, nullptr, false);
    if (parsed.is_discarded()) give_up("the results are not JSON:\n" + json.substr(0, 2000));
    document_ = std::make_shared<const Document>(Document{std::move(parsed)});
}

double Result::operator()(std::string_view pointer) const {
    const Json& value = document_->at(pointer);
    if (!value.is_number()) give_up(fmt::format("{} is {}, not a number", pointer, value.dump()));
    return value.get<double>();
}

std::string Result::text(std::string_view pointer) const {
    const Json& value = document_->at(pointer);
    if (!value.is_string()) give_up(fmt::format("{} is {}, not a string", pointer, value.dump()));
    return value.get<std::string>();
}

int Result::size(std::string_view pointer) const {
    const Json& value = document_->at(pointer);
    if (!value.is_structured()) give_up(fmt::format("{} is {}, neither object nor array", pointer, value.dump()));
    return static_cast<int>(value.size());
}

bool Result::has(std::string_view pointer) const { return document_->find(pointer) != nullptr; }

bool Result::is_null(std::string_view pointer) const { return document_->at(pointer).is_null(); }

double Result::place(std::string_view scope, std::string_view member, std::string_view quantity, double at,
                     bool after) const {
    const std::string pointer = fmt::format("/{}/members/{}/places", scope, member);
    const Json* found = nullptr;
    for (const Json& place : document_->at(pointer)) {
        if (std::abs(place.at("at").get<double>() - at) > 1e-9) continue;
        if (found == nullptr || after) found = &place;
    }
    if (found == nullptr) give_up(fmt::format("{} lists no place at {} m", pointer, at));
    const auto value = found->find(quantity);
    if (value == found->end() || !value->is_number()) {
        give_up(fmt::format("{} has no number {} at {} m", pointer, quantity, at));
    }
    return value->get<double>();
}

Result run(std::string_view toml, int places) {
    const groundsill::Model model = read(toml);
    const groundsill::Outcome outcome = groundsill::analyse(model);
    if (!outcome.analysis) {
        give_up(fmt::format("the structure is refused: {}\n{}", outcome.refusals.front().message, toml));
    }
    std::string json;
    groundsill::write_json(*outcome.analysis, groundsill::WriteOptions{places},
                           [&json](std::string_view part) { json += part; });
    return Result(json);
}

std::string diagnostics(std::string_view toml) { return lines(groundsill::read_model(toml).diagnostics); }

std::string refusal(std::string_view toml) {
    const groundsill::Model model = read(toml);
    std::string text;
    for (const groundsill::Diagnostic& refusal : groundsill::analyse(model).refusals) {
        if (!text.empty()) text += '\n';
        text += refusal.message;
    }
    return text;
}

} // namespace test
