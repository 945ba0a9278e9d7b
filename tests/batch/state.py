# heatloom-batch state: one state, and tables of them.
# SPDX-License-Identifier: GPL-3.0-or-later
import csv
import io
import json
import time

from tap import batch, main, refused

OUT = ["out_phase", "out_p_Pa", "out_T_K", "out_rho_kg_m3", "out_x", "out_h_J_kg", "out_s_J_kgK", "out_cp_J_kgK",
       "out_w_m_s", "out_error"]


def state(*pair):
    out, _ = batch("state", "water", *pair, "--json", "-")
    return json.loads(out)


def csv_rows(medium, text, status=0):
    out, err = batch("state", medium, "--table", "-", stdin=text, status=status)
    return list(csv.DictReader(io.StringIO(out))), err


def table(text, status=0):
    return csv_rows("water", text, status)


def close(value, expected, relative=1e-9):
    assert abs(value - expected) <= relative * abs(expected), f"{value!r} is not {expected!r}"


def test_region_2_agrees_with_the_release():
    # IAPWS R7-97(2012), Table 15: T = 700 K, p = 30 MPa.
    found = state("p=30 MPa", "T=700 K")
    close(found["v_m3_kg"], 0.542946619e-2, 1e-8)
    close(found["h_J_kg"], 0.263149474e7, 1e-8)
    close(found["s_J_kgK"], 0.517540298e4, 1e-8)
    close(found["cp_J_kgK"], 0.103505092e5, 1e-8)
    close(found["w_m_s"], 0.480386523e3, 1e-8)
    assert found["x"] is None and found["fluid"] == "water" and "97" in found["formulation"]


def test_keys_carry_their_units():
    found = state("p=80 bar", "T=480 °C")
    assert list(found) == ["fluid", "formulation", "phase", "p_Pa", "T_K", "h_J_kg", "s_J_kgK", "x", "rho_kg_m3",
                           "v_m3_kg", "u_J_kg", "cp_J_kgK", "cv_J_kgK", "w_m_s"], list(found)
    close(found["p_Pa"], 80e5, 1e-15)
    close(found["T_K"], 753.15, 1e-15)
    close(found["rho_kg_m3"] * found["v_m3_kg"], 1.0, 1e-14)


def test_other_media_answer_by_their_own_equation():
    out, _ = batch("state", "isopentane", "p=5 bar", "T=100 °C", "--json", "-")
    found = json.loads(out)
    assert found["fluid"] == "isopentane" and "IF97" not in found["formulation"]
    rows, _ = csv_rows("isopentane", f"T_K,rho_kg_m3\n{found['T_K']!r},{found['rho_kg_m3']!r}\n")
    close(float(rows[0]["out_p_Pa"]), 5e5, 1e-8)
    close(float(rows[0]["out_h_J_kg"]), found["h_J_kg"], 1e-8)


def test_units_and_pairs_mean_the_same_state():
    first = state("p=80 bar", "T=480 °C")
    for pair in (("p=8 MPa", "T=753.15 K"), ("T=896 °F", "p=80"), (f"p=80 bar", f"h={first['h_J_kg'] / 1000!r} kJ/kg"),
                 (f"h={first['h_J_kg'] / 1000!r}", f"s={first['s_J_kgK'] / 1000!r}"),
                 ("T=480", f"s={first['s_J_kgK'] / 1000!r} kJ/(kg K)")):
        other = state(*pair)
        close(other["h_J_kg"], first["h_J_kg"], 1e-8)
        close(other["p_Pa"], first["p_Pa"], 1e-6)


def test_wet_steam_has_a_fraction_and_no_heat_capacity():
    found = state("p=0.07 bar", "x=0.9")
    assert found["phase"] == "two-phase" and found["cp_J_kgK"] is None
    close(found["x"], 0.9, 1e-12)


def test_text_is_for_people():
    out, err = batch("state", "water", "p=80 bar", "T=480 °C")
    assert err == "" and "80" in out and "°C" in out and "kJ/kg" in out and "vapour" in out, out


def test_degrees_are_understood_in_every_locale():
    expected, _ = batch("state", "water", "p=80 bar", "T=480 °C")
    for locale in ("C", "POSIX", "de_DE.UTF-8", "no_SUCH.UTF-8"):
        out, _ = batch("state", "water", "p=80 bar", "T=480 °C", env={"LC_ALL": locale, "LANGUAGE": ""})
        assert out == expected, (locale, out)


def test_json_goes_to_a_file():
    out, _ = batch("state", "water", "p=1 bar", "x=1", "--json", "dämpf.json")
    assert out == ""
    with open("dämpf.json", encoding="utf-8") as file:
        assert json.load(file)["x"] == 1.0


def test_mistakes_are_named():
    refused("state", "ether", "p=1 bar", "T=300 K", status=2, says=["ether", "heatloom-batch fluids"])
    refused("state", "water", "p=80 bar", status=2, says="two quantities")
    refused("state", "water", "p=80 bar", "p=70 bar", status=2, says="same quantity")
    refused("state", "water", "p=80 bar", "q=3", status=2, says=["q=3", "p, T, h, s, x"])
    refused("state", "water", "p=80 bar", "T=480 furlong", status=2, says=["furlong", "°C"])
    refused("state", "water", "p=80 bar", "T=7 bar", status=2, says="T=7 bar")
    refused("state", "water", "p=80 bar", "T=", status=2, says="T=")
    refused("state", "water", "p=1200 bar", "T=480 °C", status=2, says=["1200 bar", "1000 bar"])
    refused("state", "water", "x=1", "h=2750 kJ/kg", status=2, says="more than one state")
    refused("state", "water", "--table", "a.csv", "--json", "-", status=2, says="--table")
    refused("state", "water", "p=1 bar", "T=300 K", "--json", "/nowhere/at/all.json", status=3, says="/nowhere/at/all.json")


def test_table_copies_columns_and_adds_states():
    rows, err = table('# measured\nname,p_Pa,T_K\n"a, ""b""",8e6,753.15\n\n# later\nc,1e5,300\n')
    assert err == ""
    assert [row["name"] for row in rows] == ['a, "b"', "c"]
    assert list(rows[0]) == ["name", "p_Pa", "T_K"] + OUT
    one = state("p=80 bar", "T=480 °C")
    for column, key in (("out_h_J_kg", "h_J_kg"), ("out_s_J_kgK", "s_J_kgK"), ("out_rho_kg_m3", "rho_kg_m3"),
                        ("out_cp_J_kgK", "cp_J_kgK"), ("out_w_m_s", "w_m_s"), ("out_T_K", "T_K")):
        assert float(rows[0][column]) == one[key], column          # full precision: the very same number
    assert rows[0]["out_phase"] == "vapour" and rows[1]["out_phase"] == "liquid"
    assert rows[0]["out_error"] == "" and rows[0]["out_x"] == ""


def test_table_takes_every_pair_of_columns():
    one = state("p=80 bar", "T=480 °C")
    values = {"p_Pa": 8e6, "T_K": 753.15, "h_J_kg": one["h_J_kg"], "s_J_kgK": one["s_J_kgK"], "rho_kg_m3": one["rho_kg_m3"]}
    for first in values:
        for second in values:
            if first == second or {first, second} in ({"h_J_kg", "rho_kg_m3"}, {"s_J_kgK", "rho_kg_m3"}):
                continue
            rows, _ = table(f"{first},{second}\n{values[first]!r},{values[second]!r}\n")
            assert rows[0]["out_error"] == "", rows
            close(float(rows[0]["out_h_J_kg"]), one["h_J_kg"], 1e-7)
            close(float(rows[0]["out_rho_kg_m3"]), one["rho_kg_m3"], 1e-6)
    rows, _ = table("T_K,x\n450,0.5\n")
    close(float(rows[0]["out_x"]), 0.5, 1e-12)
    assert rows[0]["out_cp_J_kgK"] == ""


def test_bad_rows_say_why_and_the_others_stand():
    rows, err = table("p_Pa,T_K\n8e6,753.15\nx,300\n8e6\n8e6,300,1\n2e8,300\n,300\n8e6,nan\n1e5,300\n")
    assert "6 of 8 rows" in err, err
    good = [row for row in rows if not row["out_error"]]
    assert len(rows) == 8 and len(good) == 2
    for row in rows:
        if row["out_error"]:
            assert all(row[name] == "" for name in OUT[:-1]), row
    assert "not a number" in rows[1]["out_error"]


def test_ragged_rows_stay_in_their_columns():
    out, _ = batch("state", "water", "--table", "-", stdin="name,p_Pa,T_K\na,8e6\n\"b,\",1,2,3\n")
    for line, name in zip(list(csv.reader(io.StringIO(out)))[1:], ("a", "b,")):
        assert len(line) == 3 + len(OUT) and line[0] == name and "columns" in line[-1], line


def test_tables_that_are_none():
    refused("state", "water", "--table", "-", stdin="", status=3, says="empty")
    refused("state", "water", "--table", "-", stdin="# only words\n", status=3, says="empty")
    refused("state", "water", "--table", "-", stdin="a,b\n1,2\n", status=3, says=["line 1", "p_Pa"])
    refused("state", "water", "--table", "-", stdin="p_Pa;T_K\n1;2\n", status=3, says="commas")
    refused("state", "water", "--table", "-", stdin="p_Pa,T_K,x\n1,2,3\n", status=3, says="3 of the columns")
    refused("state", "water", "--table", "-", stdin="p_Pa,p_Pa\n1,2\n", status=3, says="two different")
    refused("state", "water", "--table", "-", stdin="p_Pa,T_K,out_x\n1,2,3\n", status=3, says="out_x")
    refused("state", "water", "--table", "absent.csv", status=3, says="absent.csv")


def test_a_table_without_end_is_refused():
    refused("state", "water", "--table", "/dev/zero", status=3, says=["line 1", "16 MiB"])
    out, err = batch("state", "water", "--table", "-", stdin='p_Pa,T_K\n"' + "1\n" * (9 << 20), status=3)
    assert "line 2" in err and "quote" in err, err


def test_an_open_quote_names_its_line():
    out, err = batch("state", "water", "--table", "-", stdin='p_Pa,T_K\n1e5,300\n"1e5,300\n', status=3)
    assert "line 3" in err and len(out.splitlines()) == 2


def test_decimal_points_whatever_the_locale():
    out, _ = batch("state", "water", "--table", "-", stdin="p_Pa,T_K\n8e6,753.15\n", env={"LC_ALL": "de_DE.UTF-8"})
    assert "753.15" in out


def test_long_tables_are_quick():
    text = "p_Pa,h_J_kg\n" + "".join(f"{1e4 + 397.0 * i!r},{2e5 + 67.0 * i!r}\n" for i in range(50000))
    start = time.monotonic()
    rows, _ = table(text)
    assert len(rows) == 50000 and all(row["out_error"] == "" for row in rows)
    # About 0.2 s on a slow machine, reading in Python included; a table handled row by row costs many times as much.
    assert time.monotonic() - start < 10.0


main(globals())
