#include "output/page_style.hpp"

namespace irrepwise {

std::string_view page_style() {
  return R"css(:root { --ink: #1f2933; --muted: #56616d; --faint: #cdd3d9; --paper: #fdfdfc; --accent: #083f80; }
@media (prefers-color-scheme: dark) {
  :root { --ink: #e4e7ea; --muted: #a3adb7; --faint: #3c4650; --paper: #14181c; --accent: #8fbaf0; }
}
@media print {
  :root { --ink: #000; --muted: #444; --faint: #bbb; --paper: #fff; --accent: #083f80; }
}
* { box-sizing: border-box; }
body { margin: 0; overflow-wrap: break-word; background: var(--paper); color: var(--ink);
  font: 1rem/1.5 system-ui, "Liberation Sans", "Helvetica Neue", Arial, sans-serif; }
main { max-width: 68rem; margin: 0 auto; padding: 2.5rem 1.25rem 4rem; }
h1 { font-size: 1.6rem; line-height: 1.25; font-weight: 600; margin: 0 0 1.25rem; text-wrap: balance; }
h2 { font-size: 1.15rem; font-weight: 600; margin: 2.5rem 0 .75rem; }
.facts { display: grid; grid-template-columns: max-content 1fr; gap: .2rem 1.5rem; margin: 0 0 2rem; }
.facts dt { color: var(--muted); grid-column: 1; }
.facts dd { margin: 0; grid-column: 2; overflow-wrap: anywhere; }
.warnings { border-left: 3px solid var(--accent); padding: .1rem 0 .1rem 1rem; margin: 2rem 0; }
.warnings h2 { margin: 0 0 .4rem; font-size: 1rem; }
.warnings ul { margin: 0; padding-left: 1.1rem; }
.remark { color: var(--muted); max-width: 46rem; margin: .6rem 0; }
@media (max-width: 34rem) {
  main { padding: 1.25rem .9rem 3rem; }
  .facts { display: block; }
  .facts dt { margin-top: .5rem; }
}
@media print {
  main { max-width: none; padding: 0; }
  .table, .warnings { break-inside: avoid-page; }
}
)css";
}

}  // namespace irrepwise
