#!/usr/bin/env python3
"""Makes third-party-book.xlsx with XlsxWriter (Debian package python3-xlsxwriter), a writer that shares no code with this project.

Run: /usr/bin/python3 test/references/make-third-party-book.py
Invented scenario: a survey glider's wing section, decelerating edge speed; no such aircraft, nobody's data.
The values of WALL cells are deliberately left at 0 or stale, so that a recalculation has something to do.
"""
import datetime
import os

import xlsxwriter

path = os.path.join(os.path.dirname(os.path.abspath(__file__)), "third-party-book.xlsx")
book = xlsxwriter.Workbook(path)
book.set_properties({"title": "Invented wing section", "created": datetime.datetime(2026, 1, 1)})
bold = book.add_format({"bold": True, "bg_color": "#DDEEFF", "border": 1})
sci = book.add_format({"num_format": "0.000E+00"})

wing = book.add_worksheet("Wing")
other = book.add_worksheet("Läufe 'B' 第二")
wing.write("A1", "Invented: survey glider, decelerating edge speed ue = 20 (1 - x)", bold)
wing.write_row("A3", ["station x [m]", "edge speed ue [m/s]"], bold)
n = 15
for i in range(n):
    x = 0.1 * i / (n - 1)
    wing.write_number(3 + i, 0, x)
    wing.write_formula(3 + i, 1, f"=20*(1-A{4 + i})", None, 20 * (1 - x))
wing.write("A20", "nu")
wing.write_number("B20", 1.5e-5, sci)
wing.write("A21", "columns")
wing.write("B21", "station, momentum_loss, mass_defect, state")
book.define_name("nu_air", "=Wing!$B$20")
book.define_name("edge_speeds", "=Wing!$B$4:$B$18")
book.define_name("twice", "=2*nu_air")
book.define_name("'Wing'!local_start", "=0.5")

wing.write_dynamic_array_formula("D3:G18", '=_xldudf_WALL_THWAITES_MARCH(A4:A18,edge_speeds,nu_air,A21:B21)', sci, "station x")
wing.write_dynamic_array_formula("I3:I17", '=_xldudf_WALL_COLUMN_OF(_xlfn.ANCHORARRAY(D3),"mass_defect")', sci, 0)
wing.write_dynamic_array_formula("J3:J17", '=_xldudf_WALL_WALL_BLOW_VELOCITY(A4:A18,_xlfn.ANCHORARRAY(I3),0)', sci, 0)
wing.write("L3", "sum of spill")
wing.write_formula("M3", "=SUM(_xlfn.ANCHORARRAY(J3))", sci, 0)
wing.write("L4", "largest theta")
wing.write_formula("M4", "=MAX(INDEX(_xlfn.ANCHORARRAY(D3),0,2))", sci, 0)
wing.write("L5", "LET")
wing.write_formula("M5", "=_xlfn.LET(_xlpm.a,twice,_xlpm.b,local_start,_xlpm.a*_xlpm.b/nu_air)", None, 0)
wing.write("L6", "XLOOKUP")
wing.write_formula("M6", "=_xlfn.XLOOKUP(0.1,A4:A18,B4:B18,,1)", None, 0)
wing.write("L7", "unary minus")
wing.write_formula("M7", "=-2^2+B4", None, 0)
wing.write("L8", "plain call")
wing.write_formula("M8", "=_xldudf_WALL_EDGE_SPEED(-0.5,20)", None, 0)
wing.write("L9", "not ours")
wing.write_formula("M9", "=CUBEVALUE(\"x\",\"y\")", None, 42)
wing.write("L10", "wrong input")
wing.write_formula("M10", "=_xldudf_WALL_EDGE_SPEED(2,20)", None, 0)
wing.write("L11", "untouched")
wing.write_formula("M11", "=1+1", bold, 2)

chart = book.add_chart({"type": "scatter", "subtype": "smooth"})
chart.add_series({"name": "momentum loss", "categories": "=Wing!$D$4:$D$18", "values": "=Wing!$E$4:$E$18"})
chart.set_x_axis({"name": "x, m"})
wing.insert_chart("O3", chart)
wing.conditional_format("E4:E18", {"type": "data_bar"})
wing.data_validation("B20", {"validate": "decimal", "criteria": ">", "value": 0})
wing.write_comment("B20", "kinematic viscosity, invented")
wing.freeze_panes(3, 0)
wing.set_column("A:B", 18)

other.write("A1", "total of the first sheet", bold)
other.write_formula("B1", "=Wing!M3*2", sci, 0)
other.add_table("A3:B6", {"name": "Runs", "columns": [{"header": "run"}, {"header": "speed ue"}], "data": [[1, 10.0], [2, 12.0], [3, 14.0]]})
other.write_formula("D3", "=SUM(Runs[speed ue])", None, 0)
other.write_formula("D4", "=_xldudf_WALL_EDGE_SPEED(0,MAX(Runs[speed ue]))", None, 0)
wing.write("L12", "from the other sheet")
wing.write_formula("M12", "='Läufe ''B'' 第二'!D3", None, 0)
book.close()
