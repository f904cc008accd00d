#include "molecule/xyz.hpp"

#include <filesystem>
#include <fstream>
#include <string>

#include <unistd.h>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

namespace {

std::string refusal(const std::string& text) {
  try {
    (void)parse_xyz(text, "a.xyz");
  } catch (const Error& error) {
    return error.what();
  }
  return "accepted";
}

}  // namespace

TEST_CASE("a plain file gives atoms in order, and its comment is the title") {
  const XyzFile file =
      parse_xyz("2\ncarbon monoxide, E = -1\nC 0 0 -0.5\nO 0 0 +6.28e-1\n", "a.xyz");
  REQUIRE(file.molecule.size() == 2);
  CHECK(file.molecule.title() == "carbon monoxide, E = -1");
  CHECK(file.molecule.atoms()[1].atomic_number == 8);
  CHECK(file.molecule.atoms()[1].position == Eigen::Vector3d(0, 0, 0.628));
  CHECK_FALSE(file.charge.has_value());
  CHECK(file.molecule.charge() == 0);
}

TEST_CASE("line ends, tabs, blanks, byte-order mark and number styles do not matter") {
  const Molecule plain = parse_xyz("2\n\nPt 0 0 0\nCl 0 0 2.3\n", "a.xyz").molecule;
  for (const char* text :
       {"2\r\n\r\nPt 0 0 0\r\nCl 0 0 2.3\r\n\r\n \r\n",
        "\xEF\xBB\xBF"
        "2\n\nPt 0 0 0\nCl 0 0 2.3",
        " 2 \n\n\tPt\t0.0\t0.\t-0 \nCl 0 .0 2.3D0  \n\n\n", "2\n\n78 0 0 0\n17 0 0 2.30\n",
        "2\n\nPt1 0 0 0 1.5 extra\nCl2 0 0 23e-1 -0.5\n", "2\r\rPt 0 0 0\rCL 0 0 2.3\r"}) {
    CAPTURE(text);
    const Molecule molecule = parse_xyz(text, "a.xyz").molecule;
    CHECK(molecule.positions() == plain.positions());
    CHECK(hill_formula(molecule) == "ClPt");
    CHECK(molecule.title().empty());
  }
}

TEST_CASE("extended XYZ: charge, title and the columns named by Properties are used") {
  const XyzFile file = parse_xyz(
      "2\n"
      "Lattice=\"9 0 0 0 9 0 0 0 9\" Properties=id:I:1:pos:R:3:species:S:1:force:R:3 pbc=\"F F F\" "
      "charge=-1 title=\"a \\\"bent\\\" one\" flag\n"
      "1 0 0 0 O 9 9 9\n"
      "2 0 0 0.97 H 9 9 9\n",
      "a.xyz");
  CHECK(file.charge == -1);
  CHECK(file.molecule.charge() == -1);
  CHECK(file.molecule.title() == "a \"bent\" one");
  CHECK(hill_formula(file.molecule) == "HO");
  CHECK(file.molecule.atoms()[1].position == Eigen::Vector3d(0, 0, 0.97));
}

TEST_CASE("a charge is honoured in a free comment and with a decimal point") {
  CHECK(parse_xyz("1\nthe anion charge=-1 gas\nF 0 0 0\n", "a.xyz").charge == -1);
  CHECK(parse_xyz("1\nthe anion charge=-1 gas\nF 0 0 0\n", "a.xyz").molecule.title() ==
        "the anion charge=-1 gas");
  CHECK(parse_xyz("1\nCharge=+2.0\nMg 0 0 0\n", "a.xyz").charge == 2);
  CHECK(parse_xyz("1\ncharge=\"1\" charge=1\nNa 0 0 0\n", "a.xyz").charge == 1);
  CHECK(refusal("1\nq charge=0.5\nF 0 0 0\n") ==
        "a.xyz:2:10: found charge='0.5', expected a whole number such as charge=-2");
  CHECK(refusal("1\ncharge=1 charge=2\nF 0 0 0\n") ==
        "a.xyz:2:10: charge= stands here twice with different values; keep one");
}

TEST_CASE("a count that disagrees with the lines is refused both ways") {
  CHECK(refusal("3\n\nO 0 0 0\nH 0 0 1\n") ==
        "a.xyz:1:1: the first line announces 3 atoms, but 2 follow; correct the number or complete "
        "the file");
  CHECK(refusal("2\nO 0 0 0\nH 0 0 1\n") ==
        "a.xyz:1:1: the first line announces 2 atoms, but 1 follows; correct the number or "
        "complete the file; line 2 reads like an atom, where a comment (or an empty line) belongs");
  CHECK(refusal("1") ==
        "a.xyz:1:1: the first line announces 1 atom, but 0 follow; correct the number or complete "
        "the file");
  CHECK(refusal("1\n\nO 0 0 0\n\n  H 0 0 1\n") ==
        "a.xyz:5:3: the first line announces 1 atom, but more text follows; correct the number or "
        "remove the rest");
  CHECK(refusal("1\n\nO 0 0 0\n1\n\nO 0 0 1\n") ==
        "a.xyz:4:1: a second structure begins here; give a file with one structure");
  CHECK(refusal("0\n\n") == "a.xyz:1:1: found 0 atoms, expected at least one");
  CHECK(refusal("-3\n\n") == "a.xyz:1:1: found -3 atoms, expected at least one");
}

TEST_CASE("a first line that is no count is refused") {
  CHECK(refusal("O 0 0 0\nH 0 0 1\n") ==
        "a.xyz:1:1: found 'O 0 0 0', expected the number of atoms alone on the first line of an "
        "XYZ file");
  CHECK(refusal("99999999999\n\nO 0 0 0\n") ==
        "a.xyz:1:1: found '99999999999', expected the number of atoms alone on the first line of "
        "an XYZ file");
  CHECK(refusal("\x7f"
                "ELF\x01\n") ==
        "a.xyz:1:1: found '\\x7fELF\\x01', expected the number of atoms alone on the first line of "
        "an XYZ file");
  CHECK(refusal("") == "a.xyz: the text is empty; expected an XYZ file");
}

TEST_CASE("words that are no finite numbers are refused where they stand") {
  const auto with_x = [](const std::string& x) { return refusal("1\n\nFe  " + x + " 0 0\n"); };
  CHECK(with_x("1.0.0") == "a.xyz:3:5: found '1.0.0', expected a number");
  CHECK(with_x("0x10") == "a.xyz:3:5: found '0x10', expected a number");
  CHECK(with_x("+-1") == "a.xyz:3:5: found '+-1', expected a number");
  CHECK(with_x("1,5") ==
        "a.xyz:3:5: found '1,5', expected a number; write the decimal point as '.'");
  CHECK(with_x("nan") == "a.xyz:3:5: found 'nan', expected a finite number");
  CHECK(with_x("-Infinity") == "a.xyz:3:5: found '-Infinity', expected a finite number");
  CHECK(with_x("1e999") == "a.xyz:3:5: found '1e999', too large or too small for a number here");
  CHECK(with_x("1e200") == "a.xyz: atom 1: coordinates must be finite and below 10000000000 Å");
}

TEST_CASE("lines that are no atoms are refused where they stand") {
  CHECK(refusal("2\n\nFe 0 0 0\n Xq 0 0 2\n") ==
        "a.xyz:4:2: 'Xq' is not an element; did you mean 'Xe'?");
  CHECK(refusal("2\n\nFe 0 0 0\n\nFe 0 0 2\n") ==
        "a.xyz:4:1: found an empty line, expected an atom: symbol, x, y, z");
  CHECK(refusal("1\n\nFe 0 0\n") == "a.xyz:3:1: found 'Fe 0 0', expected an atom: symbol, x, y, z");
  CHECK(refusal("2\n\nFe 0 0 0\nFe 0 0 0.1\n") ==
        "a.xyz: atoms 1 (Fe) and 2 (Fe) are 0.100 Å apart, expected at least 0.3 Å; remove a "
        "double atom, or check the unit of the coordinates");
}

TEST_CASE("a Properties entry without usable columns is refused") {
  CHECK(refusal("1\na=1 Properties=species:S:1:pos:R\nFe 0 0 0\n") ==
        "a.xyz:2:5: Properties='species:S:1:pos:R': expected name:type:count for each group of "
        "columns, e.g. Properties=species:S:1:pos:R:3");
  CHECK(refusal("1\nProperties=species:S:1:pos:R:2\nFe 0 0 0\n") ==
        "a.xyz:2:1: Properties='species:S:1:pos:R:2': expected species:S:1 and pos:R:3 among the "
        "columns");
  CHECK(refusal("1\nProperties=species:S:1:mass:R:1:pos:R:3\nFe 0 0 0\n") ==
        "a.xyz:3:1: found 4 columns, expected at least 5 by Properties= in line 2");
}

TEST_CASE("files that cannot be read are refused by name") {
  const std::filesystem::path folder =
      std::filesystem::temp_directory_path() / ("irrepwise_xyz_test_" + std::to_string(getpid()));
  std::filesystem::create_directories(folder);
  const std::string missing = (folder / "missing.xyz").string();
  const std::string empty = (folder / "empty.xyz").string();
  std::ofstream(empty) << " \n\n";
  CHECK_THROWS_WITH_AS((void)read_xyz(missing),
                       (missing + ": there is no such file; check its name and folder").c_str(),
                       Error);
  CHECK_THROWS_WITH_AS((void)read_xyz(folder.string()),
                       (folder.string() + ": this is a folder; name a file in it").c_str(), Error);
  CHECK_THROWS_WITH_AS((void)read_xyz(empty),
                       (empty + ": the file is empty; check that it was written").c_str(), Error);
  std::filesystem::remove_all(folder);
}

TEST_CASE("what is written reads back as the same molecule") {
  const Molecule molecule({{78, {1e-11, -0.0, 0.123456789012}}, {17, {-2.3, 1.0 / 3.0, 12345.0}}},
                          -2);
  const std::string text = xyz_text(molecule, "made \"by hand\",\nback\\slash");
  CHECK(text ==
        "2\n"
        "Properties=species:S:1:pos:R:3 charge=-2 title=\"made \\\"by hand\\\", back\\\\slash\"\n"
        "Pt    0.0000000000    0.0000000000    0.1234567890\n"
        "Cl   -2.3000000000    0.3333333333 12345.0000000000\n");
  const XyzFile file = parse_xyz(text, "a.xyz");
  CHECK(file.charge == -2);
  CHECK(file.molecule.title() == "made \"by hand\", back\\slash");
  // Ten decimals: half a unit in the last place.
  CHECK((file.molecule.positions() - molecule.positions()).cwiseAbs().maxCoeff() <= 0.5001e-10);
}

TEST_CASE("a multiplicity is honoured, and has a place") {
  const XyzFile file = parse_xyz("2\ncharge=0 multiplicity=3\nO 0 0 0\nO 0 0 1.2\n", "a.xyz");
  CHECK(file.multiplicity == 3);
  CHECK(file.multiplicity_place == "a.xyz:2:23");
  CHECK(file.molecule.title().empty());
  CHECK(parse_xyz("1\nthe triplet Multiplicity=3\nO 0 0 0\n", "a.xyz").multiplicity == 3);
  CHECK_FALSE(parse_xyz("1\ntriplet\nO 0 0 0\n", "a.xyz").multiplicity.has_value());
  CHECK(refusal("1\nmultiplicity=0\nO 0 0 0\n") ==
        "a.xyz:2:14: found multiplicity=0, expected 2S + 1, 1 or more");
  CHECK(refusal("1\nmultiplicity=triplet\nO 0 0 0\n") ==
        "a.xyz:2:14: found multiplicity='triplet', expected 2S + 1, 1 or more, such as "
        "multiplicity=3");
  CHECK(refusal("1\nmultiplicity=1 multiplicity=3\nO 0 0 0\n") ==
        "a.xyz:2:16: multiplicity= stands here twice with different values; keep one");
}

TEST_CASE("keys that look like a slip are refused, those of other programs are not") {
  CHECK(
      refusal("1\nchrage=1\nF 0 0 0\n") ==
      "a.xyz:2:1: chrage= has no meaning here (did you mean charge=?); correct it or take it out");
  CHECK(
      refusal("1\ncharge=-1 mutliplicity=3\nF 0 0 0\n") ==
      "a.xyz:2:11: mutliplicity= has no meaning here (did you mean multiplicity=?); correct it or "
      "take it out");
  for (const char* key : {"charges", "Chagre", "mult", "MULTIPLICTY", "multiplcty"}) {
    CAPTURE(key);
    const std::string text = std::string("1\nanion ") + key + "=1\nF 0 0 0\n";
    CHECK(refusal(text).starts_with("a.xyz:2:7: "));
  }
  CHECK(refusal("1\nproperties=species:S:1:pos:R:3\nF 0 0 0\n").find("did you mean Properties=?") !=
        std::string::npos);
  for (const char* key :
       {"Lattice", "pbc", "energy", "free_energy", "stress", "virial", "dipole", "magmom", "time",
        "Time", "step", "config_type", "name", "made", "spin", "change", "Title", "label"}) {
    CAPTURE(key);
    CHECK(refusal(std::string("1\n") + key + "=1\nF 0 0 0\n") == "accepted");
  }
}
