/** Texts of --help. */
export const USAGE = {
  main: `wallsheet: boundary-layer calculation in spreadsheet cells, on the command line

usage: wallsheet COMMAND [ARGUMENTS] [--help]

  recalc IN.xlsx -o OUT.xlsx   recalculate a workbook: WALL cells, what they read and what reads them
  freeze BOOK.xlsx [-o OUT]    a plain copy: values in place of WALL cells, and a sheet of method notes
  audit BOOK.xlsx              look at every WALL cell: state, inputs, valid range, notes
  recalc --check IN.xlsx       compare the stored values with the calculated ones; exit status 1 where they differ
  eval FORMULA                 calculate one formula and print it
  list [NAME]                  list the functions, or show one with its limits and sources

  -h, --help       this text; after a command, that command's
  -V, --version    the version

exit status: 0 all well; 1 something could not be calculated, or audit found something; 2 wrong usage or unreadable file

Results are preliminary-design estimates: check them against test or a higher-order method.`,
  recalc: `wallsheet recalc IN.xlsx -o OUT.xlsx
wallsheet recalc --check [--tolerance SHARE] [--floor AMOUNT] IN.xlsx

Recalculates the workbook and writes it with the new values. Only the values of formula cells change (and the blocks of spills that grow or
shrink); styles, charts, names, comments and everything else stay byte for byte. Numbers that agree to 13 digits are left as they are.
Error cells are reported with their sentence. Cells that cannot be calculated here keep their stored value and are reported with the reason: a
function or name unknown here, a link to another book, a circle, a form of reference not known, dates counted from 1904. Where something they
read has changed they are "left for Excel", and the book is marked to be recalculated in full when it is opened. Cells whose value changes by
itself (NOW, TODAY, RAND …) keep theirs too, so that a second run changes nothing.

  -o, --output FILE   where to write; the folder must exist
      --in-place      write over IN.xlsx
      --check         write no book, but compare the stored values with the calculated ones: a test that a book still gives what it gave
      --tolerance SHARE   two numbers are alike within this share of the larger one (1e-9 unless given)
      --floor AMOUNT      and within this amount, in the cell's own unit (0 unless given)
  -q, --quiet         report nothing but failures to read or write, and differing cells
  -h, --help          this text

The report goes to standard error, one line a cell; with --check the cells that differ go to standard output. Exit status: 0; 1 if a cell shows
an error or is left for Excel, or with --check if a cell differs (what is not calculated here is reported and not compared); 2 if a file
cannot be read or written. The output appears whole or not at all.`,
  freeze: `wallsheet freeze BOOK.xlsx [-o OUT.xlsx] [--date YYYY-MM-DD]

Writes a copy for someone without Wallsheet. The book is recalculated first as by recalc; then every cell that calls a WALL function, and the block
it spilled, becomes plain values, and spill references to it (D3#) become plain ranges. A new last sheet, "method notes", tells for each of these
cells: formula, inputs, method, valid range, sources and warnings. Everything else stays byte for byte.

  -o, --output FILE   where to write; BOOK-plain.xlsx beside the book unless told
      --date DAY      the day to stand in the notes; today unless told
      --as-stored     freeze the values the file holds, without calculating
  -q, --quiet         report nothing but failures to read or write
  -h, --help          this text

The report goes to standard error as recalc's does. Exit status: 0; 1 if a cell shows an error or could not be calculated; 2 if a file cannot be
read or written.`,
  audit: `wallsheet audit BOOK.xlsx [--format table|json|csv]

Recalculates the book without writing it, and tells of every WALL cell: address, functions, and its state
  calculated   the stored values are what comes out, to 8 digits (another program's may differ beyond)
  stale        other values come out than are stored
  error        an error comes out; its sentence stands beside it
  left         it cannot be calculated here; the reason stands beside it
then what INPUT_CHECK finds amiss in the x, ue and nu of its marches, where its table says that the method's valid range ends (separated, out of
range, …), and the notes of its table. A table without the columns state and note can tell neither.

      --format FORM   table (for reading), json or csv
  -q, --quiet         no summary on standard error
  -h, --help          this text

Exit status: 0 nothing found; 1 a cell is not as calculated, an input is amiss or a range is left; 2 if the file cannot be read.`,
  eval: `wallsheet eval FORMULA

Calculates one formula and prints its value, or its table as tab-separated lines. Quote it for the shell:
  wallsheet eval '=WALL.EDGE_SPEED(-0.5,20)'
  wallsheet eval '=WALL.THWAITES_MARCH({0;0.5;1},{10;10;10},1.5E-5)'

      --csv     print comma-separated values
      --json    print JSON: a value, or an array of rows
  -h, --help    this text

Exit status: 0; 1 if the formula gives an error (its sentence goes to standard error); 2 on wrong usage.`,
  list: `wallsheet list [NAME]

Lists the functions with what each gives, or shows one function: arguments with units, result, valid range, sources, example.

      --json    print the catalogue, or the one entry, as JSON
  -h, --help    this text

Exit status: 0; 2 if there is no such function.`,
} as const;
