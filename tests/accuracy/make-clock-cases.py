"""Writes clock-cases.json: exports of many clocks, each with the instants that Python's datetime and zoneinfo give.

The reader has no part in it: every case starts from instants in UTC, which are brought to local time by zoneinfo
(IANA time zone database) and written out by strftime or by hand. Run: python3 tests/accuracy/make-clock-cases.py
"""

import json
from datetime import datetime, timedelta, timezone
from pathlib import Path
from zoneinfo import ZoneInfo

UTC = timezone.utc
cases = []


def at(text):
    """An instant: 2026-04-14T08:00 is UTC."""
    return datetime.fromisoformat(text).replace(tzinfo=UTC)


def local(text, zone):
    return datetime.fromisoformat(text).replace(tzinfo=ZoneInfo(zone)).astimezone(UTC)


def run(start, count=8, minutes=10):
    return [start + timedelta(minutes=minutes * i) for i in range(count)]


def value(i):
    return f"{4 + (i * 7 % 10) / 10:.1f}"


def table(cells, head="Time,Temp °C", sep=",", before="", after=""):
    body = "\n".join(f"{cell}{sep}{value(i)}" for i, cell in enumerate(cells))
    return f"{before}{head}\n{body}\n{after}"


def ms(instants):
    return [round(i.timestamp() * 1000) for i in instants]


def shown(instants, fmt, zone="Europe/Berlin"):
    tz = ZoneInfo(zone) if isinstance(zone, str) else zone
    return [fmt(i.astimezone(tz)) if callable(fmt) else i.astimezone(tz).strftime(fmt) for i in instants]


def ok(name, text, instants, **more):
    cases.append({"name": name, "text": text, "times": ms(sorted(set(instants))), **more})


def asks(name, text, field, choices, **more):
    """choices: value of the answer -> instants that it must give."""
    answers = [{"value": key, "times": ms(sorted(set(times)))} for key, times in choices.items()]
    cases.append({"name": name, "text": text, "asks": field, "choices": answers, **more})


def refuses(name, text, code, **more):
    cases.append({"name": name, "text": text, "refusal": code, **more})


def fixed(hours):
    return timezone(timedelta(hours=hours))


# ---- forms of a stamp, on a day over 12 so that nothing is open ---------------------------------------------------
day = run(at("2026-04-14T09:00"), 12)  # 11:00 to 12:50 in Berlin
afternoon = run(at("2026-04-14T20:40"), 12)  # crosses midnight in Berlin
forms = {
    "iso-t": "%Y-%m-%dT%H:%M:%S",
    "iso-space": "%Y-%m-%d %H:%M",
    "iso-week-day": "%a %Y-%m-%d %H:%M",
    "slashes-year-first": "%Y/%m/%d %H:%M:%S",
    "points-year-first": "%Y.%m.%d %H:%M",
    "points-year-first-dot-end": "%Y.%m.%d. %H:%M",
    "compact-t": "%Y%m%dT%H%M%S",
    "compact-space": "%Y%m%d %H%M%S",
    "compact": "%Y%m%d%H%M",
    "compact-long": "%Y%m%d%H%M%S",
    "dmy-slash": "%d/%m/%Y %H:%M",
    "dmy-point": "%d.%m.%Y %H:%M:%S",
    "dmy-dash": "%d-%m-%Y %H:%M",
    "dmy-space": "%d %m %Y %H:%M",
    "dmy-two": "%d/%m/%y %H:%M",
    "dmy-comma": "%d/%m/%Y, %H:%M:%S",
    "dmy-dash-join": "%d/%m/%Y - %H:%M",
    "dmy-underscore": "%d-%m-%Y_%H:%M:%S",
    "dmy-colon-join": "%d/%m/%Y:%H:%M:%S",
    "mdy-slash": "%m/%d/%Y %H:%M",
    "mdy-two": "%m/%d/%y %H:%M:%S",
    "mdy-dash": "%m-%d-%Y %H:%M",
    "clock-first": "%H:%M:%S %d/%m/%Y",
    "clock-first-point": "%H:%M %d.%m.%Y",
    "mdy-12": "%m/%d/%Y %I:%M %p",
    "mdy-12-tight": "%m/%d/%Y %I:%M:%S%p",
    "dmy-12-first": "%p %I:%M %d/%m/%Y",
    "named": "%d %b %Y %H:%M",
    "named-dash": "%d-%b-%y %H:%M:%S",
    "named-tight": "%d%b%Y %H:%M",
    "named-tight-two": "%d%b%y %H:%M",
    "named-upper": lambda d: d.strftime("%d-%b-%Y %H:%M").upper(),
    "named-us": "%B %d, %Y %I:%M:%S %p",
    "named-us-at": "%B %d, %Y at %I:%M %p",
    "named-ctime": "%a %b %d %H:%M:%S %Y",
    "named-year-first": "%Y %b %d %H:%M",
    "named-year-first-dash": "%Y-%b-%d %H:%M",
    "named-slash": "%d/%b/%Y:%H:%M:%S",
    "ordinal": lambda d: f"{d.day}th {d.strftime('%B %Y %H:%M')}",
    "german": lambda d: f"{d.day}. April {d.year}, {d.strftime('%H:%M')} Uhr",
    "french": lambda d: f"le {d.day} avril {d.year} à {d.strftime('%Hh%M')}",
    "spanish": lambda d: f"{d.day} de abril de {d.year} {d.strftime('%H:%M')}",
    "chinese": "%Y年%m月%d日 %H:%M:%S",
    "chinese-words": "%Y年%m月%d日%H时%M分%S秒",
    "japanese-words": "%Y年%m月%d日 %H時%M分",
    "korean": "%Y년 %m월 %d일 %H:%M",
    "korean-points": "%Y. %m. %d. %H:%M",
    "danish-points": "%d.%m.%Y %H.%M.%S",
    "finnish": lambda d: f"{d.day}.{d.month}.{d.year} klo {d.hour}.{d.minute:02}",
    "italian-points": "%d/%m/%Y %H.%M.%S",
    "iso-millis": "%Y-%m-%dT%H:%M:%S.000",
    "iso-comma-millis": "%Y-%m-%d %H:%M:%S,000",
    "iso-micros": "%Y-%m-%d %H:%M:%S.000000",
    "iso-nanos": "%Y-%m-%dT%H:%M:%S.000000000",
    "ordinal-day": "%Y-%jT%H:%M:%S",
    "apostrophe": "'%Y-%m-%d %H:%M:%S",
    "single-digits": lambda d: f"{d.month}/{d.day}/{d.year} {d.hour}:{d.minute:02}",
    "iso-wide": lambda d: "".join(chr(ord(c) + 0xFEE0) if c.isdigit() or c in ":/" else c for c in d.strftime("%Y/%m/%d %H:%M")),
}
for name, form in forms.items():
    sep = ";" if name in ("dmy-comma", "named-us", "named-us-at", "german", "iso-comma-millis") else ","
    for part, instants in (("day", day), ("night", afternoon)):
        if name == "ordinal" and part == "night":
            continue
        ok(f"form {name} {part}", table(shown(instants, form), "Time%sTemp °C" % sep, sep), instants)

# ---- twelve-hour clocks in several spellings ----------------------------------------------------------------------
halves = {
    "am-pm": ("AM", "PM", "{clock} {half}"),
    "tight": ("am", "pm", "{clock}{half}"),
    "dotted": ("a.m.", "p.m.", "{clock} {half}"),
    "dotted-wide": ("a. m.", "p. m.", "{clock} {half}"),
    "dotted-nbsp": ("a.\u00a0m.", "p.\u00a0m.", "{clock}\u202f{half}"),
    "dotted-upper": ("A.M.", "P.M.", "{clock} {half}"),
    "letter": ("A", "P", "{clock} {half}"),
    "letter-tight": ("a", "p", "{clock}{half}"),
    "german": ("vorm.", "nachm.", "{clock} {half}"),
    "german-long": ("vormittags", "nachmittags", "{clock} {half}"),
    "chinese": ("上午", "下午", "{half}{clock}"),
    "chinese-space": ("上午", "下午", "{half} {clock}"),
    "chinese-after": ("上午", "下午", "{clock} {half}"),
    "japanese": ("午前", "午後", "{half}{clock}"),
    "korean": ("오전", "오후", "{half} {clock}"),
    "turkish": ("ÖÖ", "ÖS", "{half} {clock}"),
    "turkish-after": ("ÖÖ", "ÖS", "{clock} {half}"),
    "greek": ("πμ", "μμ", "{clock} {half}"),
    "greek-dotted": ("π.μ.", "μ.μ.", "{clock} {half}"),
    "hungarian": ("de.", "du.", "{half} {clock}"),
    "czech": ("dop.", "odp.", "{clock} {half}"),
    "swedish": ("fm", "em", "{half} {clock}"),
    "albanian": ("PD", "MD", "{clock} {half}"),
    "vietnamese": ("SA", "CH", "{clock} {half}"),
    "arabic": ("ص", "م", "{clock} {half}"),
    "russian": ("ДП", "ПП", "{clock} {half}"),
    "finnish": ("ap.", "ip.", "{clock} {half}"),
    "malay": ("PG", "PTG", "{clock} {half}"),
    "dutch": ("v.m.", "n.m.", "{clock} {half}"),
}
around_noon = run(at("2026-04-14T09:40"), 6)  # 11:40 to 12:30
around_midnight = run(at("2026-04-14T21:40"), 6)  # 23:40 to 00:30


def clock12(d, before, after, pattern, seconds=True):
    clock = f"{(d.hour % 12) or 12}:{d.minute:02}" + (":00" if seconds else "")
    return pattern.format(clock=clock, half=after if d.hour >= 12 else before)


for name, (before, after, pattern) in halves.items():
    for when, instants in (("noon", around_noon), ("midnight", around_midnight)):
        cells = shown(instants, lambda d: f"{d.strftime('%Y-%m-%d')} {clock12(d, before, after, pattern)}")
        ok(f"twelve-hour {name} {when}", table(cells), instants)
        dates = shown(instants, lambda d: f"{d.strftime('%d/%m/%Y')},{clock12(d, before, after, pattern, False)}")
        ok(f"twelve-hour apart {name} {when}", table(dates, "Date,Time,Temp °C"), instants)
three = shown(around_noon, lambda d: f"{d.strftime('%d/%m/%Y')},{(d.hour % 12) or 12}:{d.minute:02},{'PM' if d.hour >= 12 else 'AM'}")
ok("twelve-hour with the half in a column of its own", table(three, "Date,Time,AM/PM,Temp °C"), around_noon)

# ---- date and time apart ------------------------------------------------------------------------------------------
night = run(at("2026-04-14T20:00"), 30)
apart = shown(night, lambda d: f"{d.strftime('%d.%m.%Y')};{d.strftime('%H:%M')}")
ok("date and time apart", table(apart, "Datum;Uhrzeit;Temp °C", ";"), night)
swapped = shown(night, lambda d: f"{d.strftime('%H:%M:%S')},{d.strftime('%Y-%m-%d')}")
ok("time before date", table(swapped, "Time,Date,Temp °C"), night)
seen = set()
first_only = []
for d in (i.astimezone(ZoneInfo("Europe/Berlin")) for i in night):
    first_only.append(f"{d.strftime('%Y-%m-%d') if d.date() not in seen else ''},{d.strftime('%H:%M')}")
    seen.add(d.date())
ok("date on the first row of each day", table(first_only, "Date,Time,Temp °C"), night)
head_only = [cell if i == 0 else "," + cell.split(",")[1] for i, cell in enumerate(first_only)]
ok("date on the very first row only", table(head_only, "Date,Time,Temp °C"), night)
hhmm = shown(night, lambda d: f"{d.strftime('%Y-%m-%d')},{d.strftime('%H%M')}")
ok("time as four digits", table(hhmm, "Date,Time,Temp °C"), night)
h_mm = shown(night, lambda d: f"{d.strftime('%Y-%m-%d')},{int(d.strftime('%H%M'))}")
ok("time as digits without leading zeros", table(h_mm, "Date,Time,Temp °C"), night)
hhmmss = shown(night, lambda d: f"{d.strftime('%Y%m%d')},{d.strftime('%H%M%S')}")
ok("date and time as digits", table(hhmmss, "Date,Time,Temp °C"), night)
dated = shown(night, lambda d: f"{d.strftime('%d/%m/%Y')} 00:00:00,{d.strftime('%H:%M:%S')}")
ok("date with an idle midnight beside its time", table(dated, "Date,Time,Temp °C"), night)
timed = shown(night, lambda d: f"{d.strftime('%d/%m/%Y')},1899-12-30 {d.strftime('%H:%M:%S')}")
ok("time with the spreadsheet's day zero", table(timed, "Date,Time,Temp °C"), night)
split = shown(night, lambda d: f"{d.year},{d.month},{d.day},{d.hour},{d.minute}")
ok("year, month, day, hour and minute in columns", table(split, "Year,Month,Day,Hour,Minute,Temp °C"), night)
german_split = shown(night, lambda d: f"{d.day};{d.month};{d.year};{d.hour};{d.minute}")
ok("the same in German", table(german_split, "Tag;Monat;Jahr;Stunde;Minute;Temp °C", ";"), night)

# ---- 24:00, leap days, leap seconds -------------------------------------------------------------------------------
def end_of_day(d):
    if d.hour == 0 and d.minute == 0:
        return f"{(d - timedelta(days=1)).strftime('%Y-%m-%d')} 24:00"
    return d.strftime("%Y-%m-%d %H:%M")


ok("24:00 is the end of its day", table(shown(night, end_of_day)), night)
leap = run(local("2024-02-28T22:00", "Europe/Berlin"), 30, 60)
ok("leap day", table(shown(leap, "%d/%m/%Y %H:%M")), leap, uploaded="2024-03-04T12:00:00Z")
century = run(local("2000-02-28T22:00", "Europe/Berlin"), 30, 60)
ok("leap day of 2000", table(shown(century, "%Y-%m-%d %H:%M")), century, uploaded="2000-03-05T12:00:00Z")
leap_second = run(at("2016-12-31T23:58"), 4, 1)
ok(
    "leap second stands for the second after it",
    table(["2016-12-31T23:58:00Z", "2016-12-31T23:59:00Z", "2016-12-31T23:59:60Z", "2017-01-01T00:01:00Z"]),
    leap_second,
    uploaded="2017-01-05T12:00:00Z",
)
# RFC 3339 §5.8, and §4.3 for -00:00: UTC known, place unknown.
ok(
    "RFC 3339 examples",
    table(["1985-04-12T23:20:50.52Z", "1985-04-12T23:30:50.52z", "1985-04-12t15:40:50.52-08:00"]),
    [at("1985-04-12T23:20:50.520"), at("1985-04-12T23:30:50.520"), at("1985-04-12T23:40:50.520")],
    uploaded="1985-05-01T00:00:00Z",
)
ok("offset -00:00 is UTC", table(shown(day, "%Y-%m-%dT%H:%M:%S-00:00", "UTC")), day)
ok(
    "leap second with an offset",
    table(["1990-12-31T15:58:00-08:00", "1990-12-31T15:59:60-08:00", "1990-12-31T16:02:00-08:00"]),
    [at("1990-12-31T23:58:00"), at("1991-01-01T00:00:00"), at("1991-01-01T00:02:00")],
    uploaded="1991-01-05T00:00:00Z",
)

# ---- offsets and zones --------------------------------------------------------------------------------------------
for name, suffix, zone in (
    ("z", "Z", UTC),
    ("colon", "+02:00", fixed(2)),
    ("plain", "+0200", fixed(2)),
    ("short", "+02", fixed(2)),
    ("minus", "\u221205:00", fixed(-5)),
    ("half", "+05:30", fixed(5.5)),
    ("quarter", "+05:45", fixed(5.75)),
    ("space", " +02:00", fixed(2)),
    ("utc", " UTC", UTC),
    ("utc-plus", " UTC+2", fixed(2)),
    ("gmt-plus", " GMT+01:00", fixed(1)),
    ("utc-in-brackets", " (UTC)", UTC),
    ("utc-plus-in-brackets", " (UTC+02:00)", fixed(2)),
    ("cest", " CEST", fixed(2)),
    ("cet", " CET", fixed(1)),
    ("mesz", " MESZ", fixed(2)),
    ("est", " EST", fixed(-5)),
    ("pdt", " PDT", fixed(-7)),
    ("akdt", " AKDT", fixed(-8)),
    ("jst", " JST", fixed(9)),
    ("aedt", " AEDT", fixed(11)),
    ("sast", " SAST", fixed(2)),
    ("iana", "+02:00[Europe/Berlin]", fixed(2)),
    ("iana-bare", " Europe/Berlin", "Europe/Berlin"),
    ("iana-us", " America/New_York", "America/New_York"),
):
    ok(f"offset {name}", table(shown(day, f"%Y-%m-%dT%H:%M:%S{suffix}", zone)), day)

statements = {
    "Time zone: Europe/Lisbon": "Europe/Lisbon",
    "Timezone;America/Chicago": "America/Chicago",
    "TZ=Asia/Tokyo": "Asia/Tokyo",
    "Zeitzone: UTC+2": fixed(2),
    "Time Zone: GMT+01:00": fixed(1),
    "Time zone: (UTC+01:00) Amsterdam, Berlin, Bern, Rome, Stockholm, Vienna": "Europe/Berlin",
    "Time zone: (GMT-06:00) Central Time (US & Canada)": "America/Chicago",
    "Time zone: W. Europe Standard Time": "Europe/Berlin",
    "Time zone: Eastern Standard Time": "America/New_York",
    "Time zone: Pacific Daylight Time": "America/Los_Angeles",
    "Time zone: Tokyo Standard Time": "Asia/Tokyo",
    "Time zone: AUS Eastern Standard Time": "Australia/Sydney",
    "Time zone: Central European Standard Time": "Europe/Warsaw",
    "Time zone: GMT Standard Time": "Europe/London",
    "Time zone: SA Pacific Standard Time": "America/Bogota",
    "Time zone: CEST": fixed(2),
    "Time zone: PDT": fixed(-7),
    "Time zone: UTC": UTC,
    "Time zone: Z": UTC,
    "Time zone: GMT": UTC,
    "Time zone: UTC offset +03:00": fixed(3),
    "UTC offset: -5": fixed(-5),
    "UTC offset: -05:30": fixed(-5.5),
    "Time zone offset: 120 min": fixed(2),
    "GMT offset (hours): 2": fixed(2),
    "Fuseau horaire : Europe/Paris": "Europe/Paris",
    "Zona horaria: America/Santiago": "America/Santiago",
    "Fuso orario: Europe/Rome": "Europe/Rome",
    "Fuso horário: America/Sao_Paulo": "America/Sao_Paulo",
    "Tijdzone: Europe/Amsterdam": "Europe/Amsterdam",
    "Strefa czasowa: Europe/Warsaw": "Europe/Warsaw",
    "Saat dilimi: Europe/Istanbul": "Europe/Istanbul",
    "时区: Asia/Shanghai": "Asia/Shanghai",
    "时区: UTC+8": fixed(8),
    "时区：UTC+08:00": fixed(8),
    "タイムゾーン: Asia/Tokyo": "Asia/Tokyo",
    "All times are in UTC": UTC,
    "All times UTC+3": fixed(3),
    "Times shown in local time (GMT+02:00)": fixed(2),
    "All times in Europe/Madrid": "Europe/Madrid",
    "# tz: America/Argentina/Buenos_Aires": "America/Argentina/Buenos_Aires",
    "Clock setting: Etc/GMT+5": fixed(-5),
    "Time zone: Etc/GMT+5": fixed(-5),
    "Time zone: America/Indiana/Indianapolis": "America/Indiana/Indianapolis",
    "Time zone: europe/berlin": "Europe/Berlin",
    "Time zone: Europe/Kiev": "Europe/Kiev",
    "Time zone: America/New York": "America/New_York",
    "Local time zone: Asia/Kolkata (UTC+05:30)": "Asia/Kolkata",
    "DST: on": None,
}
for statement, zone in statements.items():
    used = zone if zone is not None else "Europe/Berlin"
    text = table(shown(day, "%Y-%m-%d %H:%M", used), before=f"Device: X-1\n{statement}\n\n")
    more = {"lacks": ["zone-assumed"]} if zone is not None else {"says": ["zone-assumed"]}
    ok(f"zone stated {statement}", text, day, **more)

for head, zone in (
    ("Time (UTC)", UTC),
    ("Time (UTC+2)", fixed(2)),
    ("Time (GMT+01:00)", fixed(1)),
    ("Timestamp [UTC+02:00]", fixed(2)),
    ("Date Time, GMT-04:00", fixed(-4)),
    ("time_utc", UTC),
    ("utcTime", UTC),
    ("Time (Europe/London)", "Europe/London"),
    ("Time (CEST)", fixed(2)),
    ("Zeit (MESZ)", fixed(2)),
    ("Timestamp (Z)", UTC),
):
    sep = ";"
    ok(f"zone in head {head}", table(shown(day, "%Y-%m-%d %H:%M", zone), f"{head};Temp °C", sep), day, lacks=["zone-assumed"])

for name, cell, zone in (
    ("offset", "+02:00", fixed(2)),
    ("iana", "America/Chicago", "America/Chicago"),
    ("word", "CEST", fixed(2)),
    ("utc", "UTC", UTC),
    ("utc-plus", "UTC+2", fixed(2)),
):
    rows = [f"{c},{cell}" for c in shown(day, "%Y-%m-%d %H:%M", zone)]
    ok(f"zone beside each row {name}", table(rows, "Time,Zone,Temp °C"), day, lacks=["zone-assumed"])
    rows = [f"{c},{cell}" for c in shown(day, "%Y-%m-%d,%H:%M", zone)]
    ok(f"zone beside date and time {name}", table(rows, "Date,Time,Time zone,Temp °C"), day, lacks=["zone-assumed"])

# Rows whose offset changes with the season: each row's own counts.
autumn = run(at("2026-10-24T23:00"), 12, 30)
ok("offset of each row through autumn", table(shown(autumn, lambda d: d.isoformat())), autumn, uploaded="2026-10-27T12:00:00Z")
ok("letters of each row through autumn", table(shown(autumn, "%Y-%m-%d %H:%M %Z")), autumn, uploaded="2026-10-27T12:00:00Z")
us_autumn = run(at("2025-11-02T04:30"), 12, 30)
ok(
    "American letters of each row through autumn",
    table(shown(us_autumn, "%m/%d/%Y %I:%M %p %Z", "America/New_York")),
    us_autumn,
    uploaded="2025-11-04T12:00:00Z",
    answers={"dateOrder": "MDY"},
)
local_column = [f"{a},{b}" for a, b in zip(shown(autumn, "%Y-%m-%d %H:%M"), shown(autumn, "%Y-%m-%d %H:%M", "UTC"))]
ok("UTC beside local time", table(local_column, "Local time,UTC time,Temp °C"), autumn, uploaded="2026-10-27T12:00:00Z")

# Letters of winter time above rows of summer: the place's clocks, or winter time all year.
for word, hours, region in (("CET", 1, "Europe/Berlin"), ("MEZ", 1, "Europe/Berlin"), ("EST", -5, "America/New_York"), ("PST", -8, "America/Los_Angeles")):
    clock = shown(day, "%Y-%m-%d %H:%M", fixed(hours))
    asks(
        f"letters {word} above summer",
        table(clock, before=f"Time zone: {word}\n\n"),
        "zone",
        {f"{'-' if hours < 0 else '+'}{abs(hours):02}:00": day, region: [i - timedelta(hours=1) for i in day]},
    )
    winter = run(at("2026-01-14T09:00"), 8)
    ok(f"letters {word} above winter", table(shown(winter, "%Y-%m-%d %H:%M", fixed(hours)), before=f"Time zone: {word}\n\n"), winter, lacks=["zone-assumed"])
# Letters that several places use.
for word, zones in (
    ("IST", ["Asia/Kolkata", "Europe/Dublin", "Asia/Jerusalem"]),
    ("BST", ["Europe/London", "Asia/Dhaka"]),
    ("CST", ["America/Chicago", "Asia/Shanghai"]),
    ("AST", ["America/Halifax", "Asia/Riyadh"]),
):
    for place, text in (
        ("preamble", table(shown(day, "%Y-%m-%d %H:%M", UTC), before=f"Time zone: {word}\n\n")),
        ("row", table(shown(day, f"%Y-%m-%d %H:%M {word}", UTC))),
        ("head", table(shown(day, "%Y-%m-%d %H:%M", UTC), f"Time ({word}),Temp °C")),
    ):
        cases.append({"name": f"letters {word} in {place}", "text": text, "asks": "zone", "choices": []})

# ---- clock changes ------------------------------------------------------------------------------------------------
changes = {
    "Europe/Berlin": ("2026-03-29T00:00", "2026-10-24T23:30"),
    "Europe/London": ("2026-03-29T00:00", "2026-10-24T23:30"),
    "America/New_York": ("2026-03-08T06:00", "2026-11-01T04:30"),
    "America/Los_Angeles": ("2026-03-08T09:00", "2026-11-01T07:30"),
    "Australia/Lord_Howe": ("2026-10-03T14:30", "2026-04-04T14:00"),
    "America/Santiago": ("2026-09-06T03:00", "2026-04-05T02:00"),
    "Africa/Casablanca": ("2026-03-22T01:00", "2026-02-15T01:00"),
}
for zone, (spring, back) in changes.items():
    for season, start in (("spring", spring), ("autumn", back)):
        for minutes in (10, 30, 60):
            instants = run(at(start) - timedelta(hours=3), 10 * 60 // minutes, minutes)
            late = (instants[-1] + timedelta(days=2)).isoformat()
            text = table(shown(instants, "%Y-%m-%d %H:%M", zone))
            ok(f"{season} in {zone} every {minutes} min", text, instants, site=zone, uploaded=late)
            down = table(list(reversed(shown(instants, "%Y-%m-%d %H:%M", zone))))
            ok(f"{season} in {zone} every {minutes} min, newest first", down, instants, site=zone, uploaded=late)
# The logger kept winter time all summer, or summer time all winter: evenly running clocks.
for season, start, hours in (("spring", "2026-03-28T22:00", 1), ("autumn", "2026-10-24T21:00", 2)):
    for minutes in (10, 60):
        instants = run(at(start), 12 * 60 // minutes, minutes)
        text = table(shown(instants, "%Y-%m-%d %H:%M", fixed(hours)))
        ok(f"clock kept through {season} every {minutes} min", text, instants, uploaded="2026-10-30T00:00:00Z", says=["clock-change"])
# ---- order of day and month -----------------------------------------------------------------------------------------
long_run = run(at("2026-04-01T00:00"), 13 * 24, 60)
for order, form in (("DMY", "%d/%m/%Y %H:%M"), ("MDY", "%m/%d/%Y %H:%M"), ("DMY2", "%d.%m.%y %H:%M"), ("YMD2", "%y/%m/%d %H:%M"), ("MDY2", "%m-%d-%y %H:%M")):
    by = {} if order.endswith("2") and order[0] != "M" else {"orderBy": "day-over-12"}
    ok(f"order by a day over 12 at the end {order}", table(shown(long_run, form, "UTC")), long_run, site="UTC", **by)
days = run(at("2026-03-30T00:00"), 8 * 4, 360)
few = run(at("2026-04-02T00:00"), 16, 360)
for order, form in (("DMY", "%d/%m/%Y %H:%M"), ("MDY", "%m/%d/%Y %H:%M"), ("DMY2", "%d.%m.%y %H:%M"), ("MDY2", "%m/%d/%y %H:%M"), ("YMD2", "%y-%m-%d %H:%M")):
    ok(f"order by continuity {order}", table(shown(few, form, "UTC")), few, site="UTC", orderBy="continuity")
    ok(f"order by continuity {order}, newest first", table(list(reversed(shown(few, form, "UTC")))), few, site="UTC", orderBy="continuity")
one_day = run(at("2026-04-03T06:00"), 10)
swapped_day = [i.replace(month=3, day=4) for i in one_day]
asks("order of a single day", table(shown(one_day, "%d/%m/%Y %H:%M", "UTC")), "dateOrder", {"DMY": one_day, "MDY": swapped_day}, site="UTC")
both = {"DMY": one_day, "MDY": swapped_day, "YMD": None}
# 03/04/05 in two digits each: three orders, all in the past.
triple = "\n".join(f"03/04/05 {6 + i}:00,4.{i}" for i in range(6))
asks(
    "order of three two-digit numbers",
    f"Time,Temp °C\n{triple}\n",
    "dateOrder",
    {
        "DMY": run(at("2005-04-03T06:00"), 6, 60),
        "MDY": run(at("2005-03-04T06:00"), 6, 60),
        "YMD": run(at("2003-04-05T06:00"), 6, 60),
    },
    site="UTC",
    uploaded="2005-06-01T00:00:00Z",
)
for name, before, order in (
    ("start", "Start: 2026-04-03 06:00\n\n", "DMY"),
    ("start by name", "Start time: 03 Apr 2026 06:00\n\n", "DMY"),
    ("end", "End: 2026-03-04 07:30\n\n", "MDY"),
    ("stop by name", "Stopped: March 4, 2026 07:30\n\n", "MDY"),
    ("printed", "Printed: 25/04/2026\n\n", "DMY"),
    ("format", "Date format: MM/DD/YYYY\n\n", "MDY"),
    ("format German", "Datumsformat: TT.MM.JJJJ\n\n", "DMY"),
):
    instants = one_day if order == "DMY" else swapped_day
    ok(f"order by what is declared: {name}", table(shown(one_day, "%d/%m/%Y %H:%M", "UTC"), before=before), instants, site="UTC", orderBy="declared")
ok("order by the journey", table(shown(one_day, "%d/%m/%Y %H:%M", "UTC")), swapped_day, site="UTC", orderBy="journey", journey=["2026-03-03T00:00:00Z", "2026-03-06T00:00:00Z"])
ok("order by the journey's arrival", table(shown(one_day, "%d/%m/%Y %H:%M", "UTC")), one_day, site="UTC", orderBy="journey", journey=["2026-04-02T00:00:00Z", "2026-04-05T00:00:00Z"])
ok("order by the upload", table(shown(one_day, "%d/%m/%Y %H:%M", "UTC")), swapped_day, site="UTC", orderBy="upload", uploaded="2026-03-20T00:00:00Z")
early = [i.replace(month=4, day=3) for i in run(at("2026-04-03T10:00"), 6)]
asks("order that two journeys would fit", table(shown(early, "%d/%m/%Y %H:%M", "UTC")), "dateOrder", {"DMY": early, "MDY": [i.replace(month=3, day=4) for i in early]}, site="UTC", journey=["2026-03-01T00:00:00Z", "2026-04-10T00:00:00Z"])
# 11/12 at noon crosses into 12/12: one order is continuous, the other is not.
cross = run(at("2025-12-11T18:00"), 12, 60)
ok("order by the step across midnight", table(shown(cross, "%d/%m/%Y %H:%M", "UTC")), cross, site="UTC", orderBy="continuity")
same = run(at("2026-04-04T06:00"), 8)
ok("a day equal to its month asks nothing", table(shown(same, "%d/%m/%Y %H:%M", "UTC")), same, site="UTC")

# ---- epochs and serial days ---------------------------------------------------------------------------------------
seconds = [int(i.timestamp()) for i in day]
for name, cells in (
    ("seconds", [str(s) for s in seconds]),
    ("seconds with decimals", [f"{s}.000" for s in seconds]),
    ("milliseconds", [str(s * 1000) for s in seconds]),
    ("milliseconds with decimals", [f"{s * 1000}.0" for s in seconds]),
    ("microseconds", [str(s * 1_000_000) for s in seconds]),
    ("nanoseconds", [str(s * 1_000_000_000) for s in seconds]),
    ("seconds in scientific notation", [f"{s:.9E}" for s in seconds]),
):
    for head in ("timestamp", "time", "epoch", ""):
        if name == "seconds in scientific notation" and head == "":
            continue
        if head == "":
            text = "\n".join(f"{c},{value(i)} °C" for i, c in enumerate(cells)) + "\n"
        else:
            text = table(cells, f"{head},Temp °C")
        ok(f"epoch {name} under {head or 'no head'}", text, day, lacks=["zone-assumed"])
half = [s + 0.5 for s in seconds]
ok("epoch with half seconds", table([f"{h:.1f}" for h in half], "ts,Temp °C"), [i + timedelta(milliseconds=500) for i in day])
ok("epoch as JSON numbers", json.dumps([{"ts": s, "celsius": float(value(i))} for i, s in enumerate(seconds)]), day)
ok("epoch as JSON text", json.dumps([{"ts": str(s), "celsius": float(value(i))} for i, s in enumerate(seconds)]), day)
ok("epoch milliseconds as JSON text with decimals", json.dumps([{"timestamp": f"{s * 1000}.0", "celsius": value(i)} for i, s in enumerate(seconds)]), day)
ok("epoch with decimals in JSON", json.dumps([{"t": s + 0.25, "temp_c": float(value(i))} for i, s in enumerate(seconds)]), [i + timedelta(milliseconds=250) for i in day])


def serial(d, base=datetime(1899, 12, 30)):
    return (d.replace(tzinfo=None) - base) / timedelta(days=1)


berlin = [i.astimezone(ZoneInfo("Europe/Berlin")) for i in day]
ok("serial days of 1900", table([f"{serial(d):.10f}" for d in berlin], "Date,Temp °C"), day)
ok("serial days with six decimals", table([f"{serial(d):.6f}" for d in berlin], "Time,Temp °C"), day)
ok("serial days with decimal comma", table([f"{serial(d):.8f}".replace(".", ",") for d in berlin], "Zeit;Temp °C", ";"), day)
old = [f"{serial(d, datetime(1904, 1, 1)):.8f}" for d in berlin]
ok("serial days of 1904 by the journey", table(old, "Date,Temp °C"), day, journey=["2026-04-14T00:00:00Z", "2026-04-15T00:00:00Z"])
ok("serial days of 1904 by the declared start", table(old, "Date,Temp °C", before="Start: 2026-04-14 11:00\n\n"), day)
date_serial = [f"{int(serial(d))},{serial(d) % 1:.10f}" for d in berlin]
ok("serial day and fraction in two columns", table(date_serial, "Date,Time,Temp °C"), day)

# ---- elapsed and counted times ------------------------------------------------------------------------------------
trip = run(at("2026-04-14T09:00"), 40, 60)


def hms(i, form):
    total = i * 3600
    return form.format(h=total // 3600, m=total // 60 % 60, s=total % 60, d=total // 86400, hd=total // 3600 % 24, total=total, minutes=total // 60, hours=total / 3600)


for name, head, form in (
    ("h:mm:ss", "Elapsed", "{h}:{m:02}:{s:02}"),
    ("hh:mm", "Elapsed time (hh:mm)", "{h:02}:{m:02}"),
    ("seconds", "Elapsed (s)", "{total}"),
    ("seconds in words", "Seconds", "{total}"),
    ("minutes", "Minutes", "{minutes}"),
    ("minutes elapsed", "Elapsed time [min]", "{minutes}"),
    ("hours", "Elapsed hours", "{hours:.4f}"),
    ("pandas", "Elapsed", "{d} days {hd:02}:{m:02}:{s:02}"),
    ("pandas signed", "Elapsed", "{d} days +{hd:02}:{m:02}:{s:02}"),
    ("days point", "Runtime", "{d}.{hd:02}:{m:02}:{s:02}"),
    ("words", "Elapsed", "{d}d {hd}h {m}m"),
    ("words long", "Duration", "{h}h {m:02}min {s:02}s"),
    ("iso duration", "Elapsed", "PT{h}H{m}M{s}S"),
    ("plus", "Elapsed", "+{h:02}:{m:02}:{s:02}"),
    ("plus seconds", "Time (s)", "{total}"),
    ("milliseconds", "Time (ms)", "{total}000"),
    ("german", "Laufzeit (min)", "{minutes}"),
    ("french", "Durée écoulée (s)", "{total}"),
):
    text = table([hms(i, form) for i in range(40)], f"{head},Temp °C", before="Start time: 2026-04-14 11:00\n\n")
    ok(f"elapsed {name}", text, trip)
    utc_start = table([hms(i, form) for i in range(40)], f"{head},Temp °C", before="Started: 2026-04-14T09:00:00Z\n\n")
    ok(f"elapsed {name} from a start in UTC", utc_start, trip, lacks=["zone-assumed"])
    bare = table([hms(i, form) for i in range(40)], f"{head},Temp °C")
    ok(f"elapsed {name} with the start answered", bare, trip, answers={"start": "2026-04-14T09:00:00Z"})
    asks(f"elapsed {name} without a start", bare, "start", {}, journey=["2026-04-14T06:00:00Z", "2026-04-16T06:00:00Z"])
# A start in the hour that autumn repeats is a moment; what follows runs on.
over = run(at("2026-10-24T22:00"), 24, 30)
ok("elapsed through autumn runs on evenly", table([str(30 * i) for i in range(24)], "Minutes,Temp °C", before="Start: 2026-10-25 00:00\n\n"), over, uploaded="2026-10-30T00:00:00Z")

ten = run(at("2026-04-14T09:00"), 12)
plain = "\n".join(f"{i + 1},{value(i)}" for i in range(12))
bare = "\n".join(value(i) for i in range(12))
for name, before in (
    ("minutes", "Start: 2026-04-14 11:00\nInterval: 10 min\n\n"),
    ("clock", "Start time;2026-04-14 11:00:00\nSample interval;00:10:00\n\n"),
    ("seconds", "First reading: 14.04.2026 11:00\nInterval: 600 s\n\n"),
    ("in the key", "Start: 14/04/2026 11:00\nInterval (min): 10\n\n"),
    ("German", "Startzeit: 14.04.2026 11:00\nMessintervall: 10 Minuten\n\n"),
    ("date and time apart", "Start date: 14/04/2026\nStart time: 11:00\nLogging interval: 10 minutes\n\n"),
    ("in seconds key", "Start: 2026-04-14 11:00\nInterval_s: 600\n\n"),
):
    ok(f"start and interval: {name}", f"{before}No,Temp °C\n{plain}\n", ten)
    ok(f"start and interval, values alone: {name}", f"{before}Temp °C\n{bare}\n", ten)
from_zero = "\n".join(f"{i},{value(i)}" for i in range(12))
ok("start and interval with an index from 0", f"Start: 2026-04-14 11:00\nInterval: 10 min\n\nIndex,Temp °C\n{from_zero}\n", ten)
ok("interval answered", f"Start: 2026-04-14 11:00\n\nNo,Temp °C\n{plain}\n", ten, answers={"intervalSeconds": 600})
ok("start and interval answered", f"No,Temp °C\n{plain}\n", ten, answers={"intervalSeconds": 600, "start": "2026-04-14T09:00:00Z"})
asks("interval not stated", f"Start: 2026-04-14 11:00\n\nNo,Temp °C\n{plain}\n", "intervalSeconds", {})
asks("start not stated", f"Interval: 10 min\n\nNo,Temp °C\n{plain}\n", "start", {}, journey=["2026-04-14T06:00:00Z", "2026-04-16T06:00:00Z"])
asks("start not stated and no journey known", f"Interval: 10 min\n\nNo,Temp °C\n{plain}\n", "start", {})
holes = "\n".join(f"{i + 1},{value(i)}" for i in range(12) if i not in (4, 5))
ok("an index that skips leaves its place empty", f"Start: 2026-04-14 11:00\nInterval: 10 min\n\nNo,Temp °C\n{holes}\n", [t for i, t in enumerate(ten) if i not in (4, 5)])
clock_only = shown(night, "%H:%M")
ok("time of day with the date in the preamble", table(clock_only, before="Date: 2026-04-14\n\n"), night)
ok("time of day with a start in the preamble", table(clock_only, before="Start: 2026-04-14 22:00\n\n"), night)
asks("time of day alone", table(clock_only), "start", {}, journey=["2026-04-14T18:00:00Z", "2026-04-15T06:00:00Z"])

# ---- order of rows, repeats, jumps --------------------------------------------------------------------------------
iso = "%Y-%m-%dT%H:%M:%SZ"
many = run(at("2026-04-14T00:00"), 60)
cells = shown(many, iso, "UTC")
ok("newest first", table(list(reversed(cells))), many, says=["resorted"])
shuffled = [cells[(i * 37) % 60] for i in range(60)]
ok("unsorted", table(shuffled), many, says=["resorted"])
late = cells[:20] + cells[21:30] + [cells[20]] + cells[30:]
ok("one late row", table(late), many, says=["resorted"])
halves2 = cells[30:] + cells[:30]
ok("two blocks written in the wrong order", table(halves2), many, says=["resorted"])
rows = [f"{c},{value(i)}" for i, c in enumerate(cells)]
repeated = rows[:10] + rows[5:10] + rows[10:]
ok("repeats of the same reading", "Time,Temp °C\n" + "\n".join(repeated) + "\n", many, says=["duplicate-dropped"])
clashing = rows[:10] + [rows[9].split(",")[0] + ",9.9"] + rows[10:]
ok("repeats that disagree", "Time,Temp °C\n" + "\n".join(clashing) + "\n", many, says=["duplicate-conflict"])
ahead = many[:30] + [i + timedelta(days=400) for i in many[30:]]
ok("a clock that leaps ahead", table(shown(ahead, iso, "UTC")), ahead, says=["clock-jump"], uploaded="2028-01-01T00:00:00Z")
step = many[:30] + [i + timedelta(hours=5) for i in many[30:]]
ok("a hole of five hours is a gap", table(shown(step, iso, "UTC")), step, says=["gap"], lacks=["clock-jump"])
spike = many[:30] + [many[30] + timedelta(days=3650)] + many[31:]
ok("one row whose date leaps ten years", table(shown(spike, iso, "UTC")), many[:30] + many[31:], says=["clock-jump"])
spike_back = many[:30] + [at("2000-01-01T00:00")] + many[31:]
ok("one row whose date falls to 2000", table(shown(spike_back, iso, "UTC")), many[:30] + many[31:], says=["clock-jump"])
reset = many[:40] + run(at("2000-01-01T00:00"), 20)
asks(
    "a clock that restarts in 2000 after a battery change",
    table(shown(reset, iso, "UTC")),
    "part",
    {"before": many[:40], "joined": many},
)
restart = run(at("2000-01-01T00:00"), 20) + many[:40]
ok("a clock set right after its first rows", table(shown(restart, iso, "UTC")), restart, says=["clock-jump"])
back_day = many[:40] + [i - timedelta(days=3) for i in many[40:]]
asks("a clock put back three days", table(shown(back_day, iso, "UTC")), "part", {"before": many[:40], "joined": many})
overlap = run(at("2026-04-14T00:00"), 40) + run(at("2026-04-14T02:05"), 20)
asks("a clock put back within the hours already logged", table(shown(overlap, iso, "UTC")), "part", {"before": overlap[:40], "joined": many})
local_back = [f"{d.strftime('%Y-%m-%d %H:%M')}" for d in (i.astimezone(ZoneInfo("Asia/Tokyo")) for i in many)]
ok("a zone without changes asks nothing", table(local_back), many, site="Asia/Tokyo")
future = run(at("2026-04-20T11:00"), 12)
ok("readings later than the upload", table(shown(future, iso, "UTC")), future, says=["future-reading"])
ok("readings before the stated start", table(cells, before="Start: 2026-04-14T01:00:00Z\n\n"), many, says=["before-start"])
refuses("all dates decades away", table(shown(run(at("2076-04-14T00:00"), 20), iso, "UTC")), "implausible-dates")
refuses("all dates at the clock's own zero", table(shown(run(at("1970-01-01T00:00"), 20), iso, "UTC")), "implausible-dates")
asks("all dates of a clock that was never set", table(shown(run(at("2000-01-01T00:00"), 20), iso, "UTC")), "start", {})
refuses("all dates a year and more ahead", table(shown(run(at("2027-06-01T00:00"), 20), iso, "UTC")), "implausible-dates")
refuses("time that stands still", table([cells[0]] * 12), "no-time-progress")

# ---- public series --------------------------------------------------------------------------------------------------
# R datasets::beaver1 (Reynolds 1994): day of 1990, HHMM without leading zeros; 22:20 is missing.
beaver = [t for t in run(datetime(1990, 12, 12, 8, 40, tzinfo=UTC), 115) if t != datetime(1990, 12, 12, 22, 20, tzinfo=UTC)]
beaver_rows = [f"{t.strftime('%Y-%m-%d')},{t.hour * 100 + t.minute}" for t in beaver]
ok("the hours of beaver1", table(beaver_rows, "day,time,temp °C"), beaver, site="UTC", uploaded="1991-01-05T00:00:00Z")

Path(__file__).with_name("clock-cases.json").write_text(
    json.dumps({"source": __doc__.split("\n\n")[0], "generated": "python3 tests/accuracy/make-clock-cases.py", "cases": cases}, ensure_ascii=False, indent="\t") + "\n"
)
print(len(cases), "cases")
