// [job], [units], [materials], [sections].

#include "read.hpp"

using doctest::Approx;
using groundsill::DisplayUnits;
using groundsill::Material;
using groundsill::Model;
using groundsill::Section;
using test::says;

TEST_CASE("title, notes and job") {
    const Model model = test::read("job", "title = 'Quay store'\nnotes = '''two\nlines'''\n[job]\nnumber = 'GS-014'\n"
                                          "client = 'Harbour office'\nrevision = 'B'\nby = 'N. N.'\nchecked = 'M. M.'\n"
                                          "date = '3 May'\n");
    CHECK(model.title == "Quay store");
    CHECK(model.notes == "two\nlines");
    CHECK(model.job.number == "GS-014");
    CHECK(model.job.client == "Harbour office");
    CHECK(model.job.revision == "B");
    CHECK(model.job.by == "N. N.");
    CHECK(model.job.checked == "M. M.");
    CHECK(model.job.date == "3 May");
    CHECK(says("job", "title = 5") == "1:1: error: title takes a text in quotation marks: a number is given\n");
}

TEST_CASE("bare numbers are in the coherent unit of [units]") {
    const Model model = test::read("materials", "[units]\nlength = 'mm'\nforce = 'kN'\n"
                                                "[materials.steel]\nE = 210\nweight = 78.5e-9\nexpansion = 12e-6\n");
    const Material& steel = model.materials.at(0);
    CHECK(steel.E == Approx(210e9).epsilon(1e-15)); // 210 kN/mm2
    CHECK(steel.density.value() == Approx(78500 / 9.80665).epsilon(1e-15));
    CHECK(steel.expansion.value() == 12e-6);
}

TEST_CASE("what [units] does not cover is said") {
    CHECK(says("materials", "[materials.steel]\nE = 210\n") ==
          "2:1: error: materials.steel.E has no unit: write a force per area, as in \"210 MPa\", or name the units of "
          "bare "
          "numbers in [units]\n");
    CHECK(says("materials", "[materials.steel]\nE = '210'\n") ==
          "2:1: error: materials.steel.E has no unit: write a force per area, as in \"210 MPa\", or name the units of "
          "bare "
          "numbers in [units]\n");
    CHECK(says("materials", "[units]\nlength = 'm'\n[materials.steel]\nE = 210\n") ==
          "4:1: error: materials.steel.E has no unit: write a force per area, as in \"210 MPa\", or add force to "
          "[units]\n");
    CHECK(says("materials", "[units]\nforce = 'N'\n[materials.steel]\nE = 210\n") ==
          "4:1: error: materials.steel.E has no unit: write a force per area, as in \"210 MPa\", or add length to "
          "[units]\n");
    CHECK(says("materials", "[units]\nlength = 'm'\nforce = 'kN'\n[materials.steel]\nE = 210e6\ndensity = 7.85\n") ==
          "6:1: error: materials.steel.density has no unit: write a mass per volume, as in \"7.85 kg/m3\"; [units] "
          "does not "
          "cover it\n");
    CHECK(says("materials", "[units]\nlength = 'm'\nforce = 'kN'\n[materials.steel]\nE = '210'\n") ==
          "5:1: error: materials.steel.E has no unit: write a force per area, as in \"210 MPa\", or a bare number "
          "without "
          "quotation marks\n");
}

TEST_CASE("wrong units of [units] are reported once, not at every number") {
    CHECK(says("nodes", "[units]\nlength = 'foot'\nforce = 'kN'\n[nodes]\nA = [0, 0]\nB = [6, 0]\nC = [10, 0]\n") ==
          "2:1: error: units gives no unit of length: unknown unit 'foot': did you mean 'ft'?\n");
    CHECK(says("nodes", "[units]\nlength = 'kN'\n[nodes]\nA = [0, 0]\nB = [6, 0]\nC = [10, 0]\n") ==
          "2:1: error: units gives no unit of length: expected a length, got a force\n");
    CHECK(says("nodes", "[units]\nlenght = 'm'\n[nodes]\nA = [0, 0]\nB = [6, 0]\nC = [10, 0]\n") ==
          "2:1: error: unknown key 'lenght' in units; did you mean 'length'?\n");
}

TEST_CASE("units of the results follow the length unit unless display says otherwise") {
    CHECK(test::read("units", "").display == DisplayUnits::metric);
    CHECK(test::read("units", "[units]\nlength = 'm'\n").display == DisplayUnits::metric);
    CHECK(test::read("units", "[units]\nlength = 'ft'\n").display == DisplayUnits::us);
    CHECK(test::read("units", "[units]\nlength = 'in'\n").display == DisplayUnits::us);
    CHECK(test::read("units", "[units]\nlength = 'ft'\ndisplay = 'metric'\n").display == DisplayUnits::metric);
    CHECK(test::read("units", "[units]\ndisplay = 'us'\n").display == DisplayUnits::us);
}

TEST_CASE("a material") {
    const Material m = test::read("materials", "[materials.steel]\nE = '31 GPa'\npoisson = 0.2\nweight = '24.5 kN/m3'\n"
                                               "expansion = '10e-6 /K'\nstrength = '30 MPa'\n")
                           .materials.at(0);
    CHECK(m.name == "steel");
    CHECK(m.E == 31e9);
    CHECK(m.G.value() == Approx(31e9 / 2.4).epsilon(1e-15));
    CHECK(m.density.value() == Approx(24500 / 9.80665).epsilon(1e-15));
    CHECK(m.expansion == 10e-6);
    CHECK(m.tension_strength == 30e6);
    CHECK(m.compression_strength == 30e6);
    CHECK(m.position.line == 1);
    CHECK(m.position.column == 12);

    const Material bare = test::read("materials", "[materials.steel]\nE = '31 GPa'\nG = '12 GPa'\n"
                                                  "strength = { tension = '2 MPa', compression = '30 MPa' }\n")
                              .materials.at(0);
    CHECK(bare.G == 12e9);
    CHECK_FALSE(bare.density);
    CHECK_FALSE(bare.expansion);
    CHECK(bare.tension_strength == 2e6);
    CHECK(bare.compression_strength == 30e6);
}

TEST_CASE("materials that are refused") {
    const auto material = [](std::string_view keys) {
        return says("materials", "[materials.steel]\n" + std::string(keys));
    };
    CHECK(material("poisson = 0.3") ==
          "1:12: error: materials.steel lacks 'E': add Young's modulus, like E = \"31 GPa\"\n");
    CHECK(material("E = '210 GPa'\npoisson = 0.3\nG = '81 GPa'") ==
          "4:1: error: materials.steel has both 'poisson' and 'G': take one of them\n");
    CHECK(material("E = '210 GPa'\ndensity = '1 kg/m3'\nweight = '1 N/m3'") ==
          "4:1: error: materials.steel has both 'density' and 'weight': take one of them\n");
    CHECK(material("E = '210 GPa'\npoisson = 0.6") == "3:1: error: materials.steel needs a poisson above -1 and up to "
                                                      "0.5, like 0.2 for concrete and 0.3 for steel\n");
    CHECK(material("E = '0 GPa'") == "2:1: error: materials.steel.E must be above 0\n");
    CHECK(material("E = '210 GPa'\ndensity = '-1 kg/m3'") ==
          "3:1: error: materials.steel.density must not be negative\n");
    CHECK(material("E = '210 kN'") ==
          "2:1: error: materials.steel.E does not fit: expected a force per area, got a force\n");
    CHECK(material("E = '210 GPA'") ==
          "2:1: error: materials.steel.E cannot be read: unknown unit 'GPA': did you mean 'GPa'?\n");
    CHECK(material("E = true") ==
          "2:1: error: materials.steel.E takes a force per area, like \"12 MPa\": true or false is given\n");
    CHECK(material("E = nan") ==
          "2:1: error: materials.steel.E takes a force per area, like \"12 MPa\": nan is given\n");
    CHECK(material("E = -inf") ==
          "2:1: error: materials.steel.E takes a force per area, like \"12 MPa\": inf is given\n");
    CHECK(material("E = 1979-05-27") ==
          "2:1: error: materials.steel.E takes a force per area, like \"12 MPa\": a date or time is given\n");
    CHECK(material("E = ['210 GPa']") ==
          "2:1: error: materials.steel.E takes a force per area, like \"12 MPa\": an array is given\n");
    CHECK(material("E = '210 GPa'\nstrength = { tension = '2 MPa' }") ==
          "3:1: error: materials.steel.strength lacks 'compression'\n");
    CHECK(material("E = '210 GPa'\npoisson = '0.3'") ==
          "3:1: error: materials.steel.poisson takes a number: write it without quotation marks\n");
    CHECK(says("materials", "materials = 3") == "1:1: error: materials takes a table: a number is given\n");
    CHECK(says("materials", "materials.steel = 3") ==
          "1:11: error: materials.steel takes a table: a number is given\n");
}

TEST_CASE("a section by its shape") {
    const Section s = test::read("sections", "[sections.bar]\nshape = 'rectangle'\nwidth = '300 mm'\ndepth = '0.6 m'\n")
                          .sections.at(0);
    CHECK(s.description == "rectangle 300 mm x 0.6 m");
    CHECK(s.A == Approx(0.18).epsilon(1e-15));
    CHECK(s.I == Approx(0.0054).epsilon(1e-15));
    CHECK(s.depth == 0.6);
    CHECK(s.top == 0.3);
    CHECK(s.bottom == 0.3);
    CHECK_FALSE(s.shear_area);
}

TEST_CASE("each shape takes its own dimensions") {
    const auto description = [](std::string_view keys) {
        return test::read("sections", "[sections.bar]\n" + std::string(keys)).sections.at(0).description;
    };
    CHECK(description("shape='circle'\ndiameter='90 mm'") == "circle 90 mm");
    CHECK(description("shape='pipe'\ndiameter='90 mm'\nwall='5 mm'") == "pipe 90 mm x 5 mm");
    CHECK(description("shape='box'\nwidth='90 mm'\ndepth='80 mm'\nwall='5 mm'") == "box 90 mm x 80 mm x 5 mm");
    CHECK(description("shape='i'\ndepth='300 mm'\nwidth='150 mm'\nweb='7 mm'\nflange='11 mm'") ==
          "i 300 mm x 150 mm x 7 mm x 11 mm");
    CHECK(description("shape='i'\ndepth='300 mm'\nwidth='150 mm'\nweb='7 mm'\nflange='11 mm'\nroot='15 mm'") ==
          "i 300 mm x 150 mm x 7 mm x 11 mm x 15 mm");
    CHECK(description("shape='tee'\ndepth='300 mm'\nwidth='150 mm'\nweb='7 mm'\nflange='11 mm'") ==
          "tee 300 mm x 150 mm x 7 mm x 11 mm");
    CHECK(description("shape='channel'\ndepth='300 mm'\nwidth='150 mm'\nweb='7 mm'\nflange='11 mm'") ==
          "channel 300 mm x 150 mm x 7 mm x 11 mm");
}

TEST_CASE("shear area and overridden properties") {
    const Section shear =
        test::read("sections", "[sections.bar]\nshape='rectangle'\nwidth='0.3 m'\ndepth='0.6 m'\nshear=true\n")
            .sections.at(0);
    CHECK(shear.shear_area.value() == Approx(0.15).epsilon(1e-15)); // 5/6 A
    const Section changed = test::read("sections", "[sections.bar]\nshape='rectangle'\nwidth='0.3 m'\ndepth='0.6 m'\n"
                                                   "A='0.1 m2'\nI='0.002 m4'\nshear_area='0.07 m2'\n")
                                .sections.at(0);
    CHECK(changed.A == 0.1);
    CHECK(changed.I == 0.002);
    CHECK(changed.shear_area == 0.07);
    CHECK(changed.top == 0.3);
}

TEST_CASE("a section by its properties has its centroid at mid-depth") {
    const Section s =
        test::read("sections", "[sections.bar]\nA='5380 mm2'\nI='8356e4 mm4'\ndepth='300 mm'\nshear_area='2568 mm2'\n")
            .sections.at(0);
    CHECK(s.description == "properties");
    CHECK(s.A == 0.00538);
    CHECK(s.I == 8356e-8);
    CHECK(s.shear_area == 0.002568);
    CHECK(s.top == 0.15);
    CHECK(s.bottom == 0.15);
    const Section bare = test::read("sections", "[sections.bar]\nA='1 m2'\nI='1 m4'\n").sections.at(0);
    CHECK_FALSE(bare.depth);
    CHECK_FALSE(bare.top);
}

TEST_CASE("rolled sections come from the tables") {
    const groundsill::ReadResult result = groundsill::read_model(
        test::with("sections", "[sections.bar]\ndesignation = 'ipe300'\nshear = true\nI = '1e-4 m4'"));
    REQUIRE(result.model);
    const Section& bar = result.model->sections[0];
    CHECK(bar.description == "IPE 300");
    CHECK(bar.A == doctest::Approx(53.812e-4).epsilon(1e-4)); // EN 10365, from the nominal dimensions
    CHECK(bar.I == 1e-4);                                     // a given property overrides the table's
    CHECK(*bar.depth == 0.3);
    CHECK(*bar.shear_area == doctest::Approx(0.3 * 0.0071));
}

TEST_CASE("sections that are refused") {
    const auto section = [](std::string_view keys) { return says("sections", "[sections.bar]\n" + std::string(keys)); };
    CHECK(section("shape = 'rectangle'\nwidth = '1 m'") ==
          "1:11: error: sections.bar lacks 'depth', which a rectangle needs\n");
    CHECK(section("shape = 'circle'\ndiameter = '1 m'\nwall = '1 mm'") ==
          "4:1: error: sections.bar gives wall, which the shape circle does not have\n");
    CHECK(section("shape = 'tee'\ndepth='300 mm'\nwidth='150 mm'\nweb='7 mm'\nflange='11 mm'\nroot='15 mm'") ==
          "7:1: error: sections.bar gives root, which the shape tee does not have\n");
    CHECK(section("shape = 'rectangel'\nwidth = '1 m'\ndepth = '1 m'") ==
          "2:1: error: sections.bar.shape takes \"rectangle\", \"circle\", \"pipe\", \"box\", \"i\", \"tee\", "
          "\"channel\": "
          "'rectangel' is none of them; the nearest word is \"rectangle\"\n");
    CHECK(section("A = '1 m2'") ==
          "1:11: error: sections.bar lacks 'I': give the section a shape, a designation, or A and I\n");
    CHECK(section("A = '1 m2'\nI = '1 m4'\nwidth = '1 m'") ==
          "4:1: error: sections.bar gives width without a shape: add shape = \"...\", or take it out\n");
    CHECK(section("designation = 'IPE 310'") ==
          "2:1: error: sections.bar names \"IPE 310\", which is not in the tables: did you mean IPE 300, IPE 330, "
          "IPE 270; `groundsill sections` lists them\n");
    CHECK(section("designation = 'IPE 300'\nroot = '1 mm'") ==
          "3:1: error: sections.bar gives root beside a designation, which has its own dimensions: take it out\n");
    CHECK(section("designation = 'IPE 300'\nshape = 'i'") == test::Contains{"designation"});
    CHECK(section("A = '1 m2'\nI = '1 m4'\nshear = true") ==
          "4:1: error: sections.bar has shear without a shape: give shear_area instead\n");
    CHECK(section("shape = 'pipe'\ndiameter = '100 mm'\nwall = '60 mm'") ==
          test::Contains{"2:1: error: sections.bar is no section: "});
    CHECK(section("shape = 'circle'\ndiameter = '1 m'\nshear = 1") ==
          "4:1: error: sections.bar.shear takes true or false: a number is given\n");
}
