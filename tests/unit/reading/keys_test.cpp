// The table of keys.

#include <set>

#include "read.hpp"
#include "reading/fields.hpp"
#include "reading/keys.hpp"

using namespace groundsill::reading;

TEST_CASE("the table of keys is whole") {
    std::set<std::string_view> groups{"model"};
    for (const Key& key : all_keys()) each_word(key.group, [&](std::string_view group, bool) { groups.insert(group); });
    for (const Key& key : all_keys()) {
        CAPTURE(key.group);
        CAPTURE(key.name);
        CHECK_FALSE(key.meaning.empty());
        CHECK(key.forms != 0);
        // A table has the keys of another group; words are there to choose from.
        CHECK(((key.forms & (table | tables)) != 0) == !key.inner.empty());
        if (!key.inner.empty()) CHECK(groups.contains(key.inner));
        if ((key.forms & (word | words | name | names)) != 0) CHECK_FALSE(key.words.empty());
    }
    for (const std::string_view group : groups) {
        CAPTURE(group);
        CHECK_FALSE(key_group(group).keys.empty());
        std::set<std::pair<std::string_view, unsigned>> seen;
        for (const GroupKey& key : key_group(group).keys) CHECK(seen.insert({key.name, key.key->loads}).second);
        CHECK(key_group(group).keys.size() <= Fields::most);
    }
}

TEST_CASE("every group is reached from the top of the file") {
    std::set<std::string_view> reached{"model"};
    for (std::size_t before = 0; before != reached.size();) {
        before = reached.size();
        for (const std::string_view group : std::set(reached)) {
            for (const GroupKey& key : key_group(group).keys) {
                if (!key.key->inner.empty()) reached.insert(key.key->inner);
            }
        }
    }
    for (const Key& key : all_keys()) {
        each_word(key.group, [&](std::string_view group, bool) { CHECK_MESSAGE(reached.contains(group), group); });
    }
}

TEST_CASE("what later work brings is known and refused") {
    const std::pair<const char*, const char*> refused[] = {
        {"[soils.clay]\nE = '18 MPa'", "1:2: error: soils is not available yet\n"},
        {"[checks.bending]\nmembers = ['AB']", "1:2: error: checks is not available yet\n"},
        {"[mass]\nnodes = { B = '1 t' }\nstate = 'sls'", "3:1: error: mass.state is not available yet\n"},
        {"[floor]\nuse = 'office'", "1:2: error: floor is not available yet\n"},
        {"[stability]\nmodes = 3", "1:2: error: stability is not available yet\n"},
        {"[materials.m]\nE = '1 GPa'\ncreep = 2", "3:1: error: materials.m.creep is not available yet\n"},
        {"[members.X]\nfrom = 'A'\nto = 'C'\nsection = 'bar'\nmaterial = 'steel'\nacts = 'tension'",
         "6:1: error: members.X.acts is not available yet\n"},
        {"[members.X]\nfrom = 'A'\nto = 'C'\nsection = 'bar'\nmaterial = 'steel'\nbed = { stiffness = '1 MN/m2' }",
         "6:1: error: members.X.bed is not available yet\n"},
        {"[supports]\nB = { pad = { width = '1 m' } }", "2:7: error: supports.B.pad is not available yet\n"},
        {"[supports]\nB = { pile = { stiffness = '1 MN/m' } }", "2:7: error: supports.B.pile is not available yet\n"},
        {"[supports]\nB = { y = { stiffness = '1 MN/m', gap = '1 mm' } }",
         "2:35: error: supports.B.y.gap is not available yet\n"},
        {"[supports]\nB = { y = { stiffness = '1 MN/m', contact = 'compression' } }",
         "2:35: error: supports.B.y.contact is not available yet\n"},
        {"[supports]\nB = { y = { stiffness = '1 MN/m', varies = [0.5, 2], nominal = 1 } }",
         "2:35: error: supports.B.y.varies is not available yet\n2:54: error: supports.B.y.nominal is not available "
         "yet\n"},
        {"[cases.c]\nduration = 'long'\nloads = [{ self_weight = 1 }]",
         "2:1: error: cases.c.duration = \"long\" is not available yet\n"},
        {"[cases.c]\nloads = [{ member = 'AB', ground = '-1 mm' }]",
         "2:27: error: cases.c.loads[0].ground is not available yet\n"},
        {"[cases.c]\nloads = [{ self_weight = 1, varies = [0, 1] }]",
         "2:29: error: cases.c.loads[0].varies is not available yet\n"},
        {"[combinations.code]\nstandard = 'EN 1990'\nsets = ['strength']",
         "2:1: error: combinations.code.standard is not available yet\n3:1: error: combinations.code.sets is not "
         "available yet\n"},
    };
    for (const auto& [text, expected] : refused) {
        CAPTURE(text);
        // The tables of the sound model stay; those that the text opens again stand on other lines.
        std::string model = std::string(text) + "\n";
        for (const auto& [name, table] : test::sound_tables) {
            const bool opened = name == "supports" && model.starts_with("[supports]");
            if (!opened) model += table;
        }
        if (model.starts_with("[supports]")) model.insert(model.find("\n", 11) + 1, "A = 'pinned'\nC = 'roller'\n");
        CHECK(test::diagnostics(model) == expected);
    }
}

TEST_CASE("an unknown key at any depth is told with the nearest known one") {
    CHECK(test::says("colour", "colour = 'red'") ==
          "1:1: error: unknown key 'colour' at the top of the file; the nearest known key is 'floor'\n");
    CHECK(test::says("job", "[job]\nnumbr = '1'") ==
          "2:1: error: unknown key 'numbr' in job; did you mean 'number'?\n");
    CHECK(test::says("member", "[member.X]\n") ==
          "1:2: error: unknown key 'member' at the top of the file; did you mean 'members'?\n");
    CHECK(test::says("materials",
                     "[materials.steel]\nE = '1 GPa'\nstrength = { tensoin = '1 MPa', compression = '1 MPa' }") ==
          "3:14: error: unknown key 'tensoin' in materials.steel.strength; did you mean 'tension'?\n");
}
