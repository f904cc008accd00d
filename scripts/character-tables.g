# Prints the character tables of the point groups up to n = 12; run by make-character-tables.
#
# Each table is taken twice, from the library of character tables and by computing it from a group,
# and the two must agree up to the order of rows and columns; otherwise nothing is written.

if LoadPackage("ctbllib") <> true then
  QuitGap(1);
fi;

digits := 25;

# Fixed-point numbers: integers times 10^-40, 15 guard digits beyond those printed.
unit := 10^40;

# arctan(1/k) by its series; pi by Machin's formula.
ArctanOfInverse := function(k)
  local sum, power, i;
  sum := 0;
  power := unit / k;
  i := 0;
  while power > 1 do
    sum := sum + (-1)^i * power / (2*i + 1);
    power := power / k^2;
    i := i + 1;
  od;
  return Int(sum);
end;
pi := 4 * (4*ArctanOfInverse(5) - ArctanOfInverse(239));

# Power series of cos (start 0) or sin (start 1) at the angle x / unit.
Series := function(x, start)
  local sum, term, i;
  sum := 0;
  term := unit;
  if start = 1 then
    term := x;
  fi;
  i := start;
  while term <> 0 do
    sum := sum + term;
    term := -QuoInt(QuoInt(term * x, unit) * x, unit * (i+1) * (i+2));
    i := i + 2;
  od;
  return sum;
end;

# A cyclotomic number is a rational combination of E(n)^k, E(n) = exp(2 pi i / n).
Part := function(value, start)
  local n, coefficients, k, sum;
  n := Conductor(value);
  coefficients := CoeffsCyc(value, n);
  sum := 0;
  for k in [1..n] do
    if coefficients[k] <> 0 then
      sum := sum + coefficients[k] * Series(Int(2*pi*(k-1)/n), start);
    fi;
  od;
  return sum;
end;

Decimal := function(fixed)
  local rounded, sign, text;
  rounded := Int(fixed * 10^digits / unit + SignInt(NumeratorRat(fixed)) / 2);
  sign := "";
  if rounded < 0 then
    sign := "-";
  fi;
  rounded := AbsInt(rounded);
  if rounded mod 10^digits = 0 then
    return Concatenation(sign, String(rounded / 10^digits));
  fi;
  text := ShallowCopy(String(rounded mod 10^digits));
  while Length(text) < digits do
    text := Concatenation("0", text);
  od;
  while text[Length(text)] = '0' do
    Remove(text);
  od;
  return Concatenation(sign, String(QuoInt(rounded, 10^digits)), ".", text);
end;

Complex := function(value)
  if IsRat(value) then
    return Concatenation(Decimal(value * unit), ",0");
  fi;
  return Concatenation(Decimal(Part(value, 0)), ",", Decimal(Part(value, 1)));
end;

Row := function(name, cells)
  return Concatenation(name, ",", JoinStringsWithSeparator(cells, ","), "\n");
end;

output := "";
Table := function(symbols, table, group)
  local computed, row;
  computed := CharacterTable(group);
  if TransformingPermutationsCharacterTables(table, computed) = fail then
    Print("make-character-tables: ", symbols, ": library and computation disagree\n");
    QuitGap(1);
  fi;
  Append(output, Concatenation("group,", symbols, "\n"));
  Append(output, Row("class_sizes", List(SizesConjugacyClasses(table), String)));
  Append(output, Row("element_orders", List(OrdersClassRepresentatives(table), String)));
  for row in Irr(table) do
    Append(output, Row("irrep", List(ValuesOfClassFunction(row), Complex)));
  od;
end;

Symbol := function(letter, n, tail)
  return Concatenation(letter, String(n), tail);
end;
Times := function(table, n)
  return CharacterTableDirectProduct(table, CharacterTable("Cyclic", n));
end;
DihedralTable := function(order)
  if order = 2 then
    return CharacterTable("Cyclic", 2);
  elif order = 4 then
    return Times(CharacterTable("Cyclic", 2), 2);
  fi;
  return CharacterTable("Dihedral", order);
end;
z2 := CyclicGroup(2);

# Cyclic groups of order n: Cn; S2m where n = 2m; of order 2 also Cs and Ci (= S2).
for n in [1..24] do
  symbols := "";
  if n <= 12 then
    symbols := Symbol("C", n, "");
  fi;
  if n = 2 then
    symbols := Concatenation(symbols, " Cs Ci");
  elif n mod 2 = 0 then
    symbols := NormalizedWhitespace(Concatenation(symbols, " ", Symbol("S", n, "")));
  fi;
  if symbols <> "" then
    Table(symbols, CharacterTable("Cyclic", n), CyclicGroup(n));
  fi;
od;

# Cn x C2: Cnh.
for n in [2..12] do
  Table(Symbol("C", n, "h"), Times(CharacterTable("Cyclic", n), 2),
        DirectProduct(CyclicGroup(n), z2));
od;

# Dihedral groups of order 2n: Cnv and Dn; Dmd where n = 2m (for odd m too, as Dm x C2 = D2m there).
for n in [2..24] do
  symbols := "";
  if n <= 12 then
    symbols := Concatenation(Symbol("C", n, "v"), " ", Symbol("D", n, ""));
  fi;
  if n mod 2 = 0 and n > 2 then
    symbols := NormalizedWhitespace(Concatenation(symbols, " ", Symbol("D", n/2, "d")));
  fi;
  if symbols <> "" then
    Table(symbols, DihedralTable(2*n), DihedralGroup(2*n));
  fi;
od;

# Dn x C2: Dnh.
for n in [2..12] do
  Table(Symbol("D", n, "h"), Times(DihedralTable(2*n), 2), DirectProduct(DihedralGroup(2*n), z2));
od;

Table("T", CharacterTable("A4"), AlternatingGroup(4));
Table("Th", Times(CharacterTable("A4"), 2), DirectProduct(AlternatingGroup(4), z2));
Table("Td O", CharacterTable("S4"), SymmetricGroup(4));
Table("Oh", Times(CharacterTable("S4"), 2), DirectProduct(SymmetricGroup(4), z2));
Table("I", CharacterTable("A5"), AlternatingGroup(5));
Table("Ih", Times(CharacterTable("A5"), 2), DirectProduct(AlternatingGroup(5), z2));

SetPrintFormattingStatus("*stdout*", false);
Print("# Character tables of the point groups up to n = 12, by the abstract groups behind them.\n");
Print("# Source: GAP ", GAPInfo.Version, " with its library of character tables CTblLib ",
      InstalledPackageVersion("ctbllib"), " (www.gap-system.org),\n");
Print("#   each table also computed by GAP from the group and found the same.\n");
Print("# Rewrite: scripts/make-character-tables > tests/reference/gap_character_tables.csv\n");
Print("# group: all Schoenflies symbols with that table. Isomorphisms: Cnv = Dn; Dnd = D2n of order 4n;\n");
Print("#   Cnh = Cn x C2; Dnh = Dn x C2; S2n cyclic of order 2n; T = A4; Th = A4 x C2; Td = O = S4;\n");
Print("#   Oh = S4 x C2; I = A5; Ih = A5 x C2 (common knowledge of group theory).\n");
Print("# irrep: real and imaginary part for each class in turn, exact cyclotomic numbers rounded to ",
      digits, "\n#   decimals. The order of classes and irreps is GAP's.\n");
Print(output);
QuitGap(0);
