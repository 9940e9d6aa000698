"""Writes export-cases.json: exports in many languages and forms, each with the figures of the trace it was written from.

The figures are counted here, from the numbers before they are written: sums are exact fractions, instants are Python's
datetime and zoneinfo. Nothing of the reader is used. Run from the project's folder: python3 tests/accuracy/make-export-cases.py
"""
import json, random
from datetime import datetime as D, timedelta, timezone
from fractions import Fraction
from zoneinfo import ZoneInfo

UTC = timezone.utc
BERLIN = ZoneInfo("Europe/Berlin")
cases = []


def iso(at):
    return at.astimezone(UTC).strftime("%Y-%m-%dT%H:%M:%S.000Z")


def trace(n=14, start=D(2026, 3, 14, 9, 20, tzinfo=UTC), step=600, seed=1, base=30):
    r = random.Random(seed)
    out, value = [], base
    for i in range(n):
        value += r.randint(-4, 4)
        out.append((start + timedelta(seconds=step * i), value))
    return out


def c(value, sign="."):
    return ("-" if value < 0 else "") + str(abs(value) // 10) + sign + str(abs(value) % 10)


def figures(pairs, missing=0):
    values = [Fraction(value, 10) for _, value in pairs]
    steps = [int((b[0] - a[0]).total_seconds()) for a, b in zip(pairs, pairs[1:])]
    usual = min(s for s in set(steps) if steps.count(s) == max(steps.count(t) for t in set(steps)))
    long = [[iso(a[0]), iso(b[0])] for (a, b), s in zip(zip(pairs, pairs[1:]), steps) if s > 1.5 * usual]
    return {"readings": len(pairs), "missing": missing, "firstAt": iso(pairs[0][0]), "lastAt": iso(pairs[-1][0]),
            "minCelsius": float(min(values)), "maxCelsius": float(max(values)),
            "meanCelsius": float(sum(values) / len(values)), "intervalSeconds": usual, "longSteps": long}


def add(name, lines, pairs, answers=None, asked=None, choices=None, site="UTC", says=(), lacks=(), missing=0, channels=None):
    """asked: the field of the question that comes first; answers: what is then answered, or given at once."""
    cases.append({"name": name, "text": "\n".join(lines) + "\n", "answers": answers or {}, "asked": asked,
                  "choices": choices or [], "site": site, "says": list(says), "lacks": list(lacks),
                  "channels": channels or [], "figures": figures(pairs, missing)})


# date, time, temperature, humidity, serial, start, interval, zone, decimal sign, months
L = {
    "da": ("Dato", "Klokkeslæt", "Temperatur", "Luftfugtighed", "Serienummer", "Starttidspunkt", "Interval", "Tidszone", ",", "jan feb mar apr maj jun jul aug sep okt nov dec"),
    "sv": ("Datum", "Klockslag", "Temperatur", "Luftfuktighet", "Serienummer", "Starttid", "Intervall", "Tidszon", ",", "jan feb mars apr maj juni juli aug sep okt nov dec"),
    "nb": ("Dato", "Klokkeslett", "Temperatur", "Luftfuktighet", "Serienummer", "Starttid", "Intervall", "Tidssone", ",", "jan feb mar apr mai jun jul aug sep okt nov des"),
    "fi": ("Päivämäärä", "Kellonaika", "Lämpötila", "Kosteus", "Sarjanumero", "Aloitusaika", "Mittausväli", "Aikavyöhyke", ",", "tammi helmi maalis huhti touko kesä heinä elo syys loka marras joulu"),
    "cs": ("Datum", "Čas", "Teplota", "Vlhkost", "Sériové číslo", "Začátek", "Interval", "Časové pásmo", ",", "led úno bře dub kvě čvn čvc srp zář říj lis pro"),
    "sk": ("Dátum", "Čas", "Teplota", "Vlhkosť", "Sériové číslo", "Začiatok", "Interval", "Časové pásmo", ",", "jan feb mar apr máj jún júl aug sep okt nov dec"),
    "hu": ("Dátum", "Idő", "Hőmérséklet", "Páratartalom", "Sorozatszám", "Kezdés", "Időköz", "Időzóna", ",", "jan. febr. márc. ápr. máj. jún. júl. aug. szept. okt. nov. dec."),
    "ro": ("Data", "Ora", "Temperatură", "Umiditate", "Număr de serie", "Ora de început", "Interval", "Fus orar", ",", "ian. feb. mar. apr. mai iun. iul. aug. sept. oct. nov. dec."),
    "el": ("Ημερομηνία", "Ώρα", "Θερμοκρασία", "Υγρασία", "Σειριακός αριθμός", "Έναρξη", "Διάστημα", "Ζώνη ώρας", ",", "Ιαν Φεβ Μαρ Απρ Μαΐ Ιουν Ιουλ Αυγ Σεπ Οκτ Νοε Δεκ"),
    "ru": ("Дата", "Время", "Температура", "Влажность", "Серийный номер", "Начало", "Интервал", "Часовой пояс", ",", "янв фев мар апр мая июн июл авг сен окт ноя дек"),
    "uk": ("Дата", "Час", "Температура", "Вологість", "Серійний номер", "Початок", "Інтервал", "Часовий пояс", ",", "січ лют бер кві тра чер лип сер вер жов лис гру"),
    "bg": ("Дата", "Час", "Температура", "Влажност", "Сериен номер", "Начало", "Интервал", "Часова зона", ",", "яну фев мар апр май юни юли авг сеп окт ное дек"),
    "hr": ("Datum", "Vrijeme", "Temperatura", "Vlažnost", "Serijski broj", "Početak", "Interval", "Vremenska zona", ",", "sij velj ožu tra svi lip srp kol ruj lis stu pro"),
    "sl": ("Datum", "Ura", "Temperatura", "Vlažnost", "Serijska številka", "Začetek", "Interval", "Časovni pas", ",", "jan feb mar apr maj jun jul avg sep okt nov dec"),
    "et": ("Kuupäev", "Kellaaeg", "Temperatuur", "Niiskus", "Seerianumber", "Algus", "Intervall", "Ajavöönd", ",", "jaan veebr märts apr mai juuni juuli aug sept okt nov dets"),
    "lv": ("Datums", "Laiks", "Temperatūra", "Mitrums", "Sērijas numurs", "Sākums", "Intervāls", "Laika josla", ",", "janv. febr. marts apr. maijs jūn. jūl. aug. sept. okt. nov. dec."),
    "pl": ("Data", "Godzina", "Temperatura", "Wilgotność", "Numer seryjny", "Czas rozpoczęcia", "Interwał", "Strefa czasowa", ",", "sty lut mar kwi maj cze lip sie wrz paź lis gru"),
    "tr": ("Tarih", "Saat", "Sıcaklık", "Nem", "Seri No", "Başlangıç zamanı", "Kayıt aralığı", "Saat dilimi", ",", "Oca Şub Mar Nis May Haz Tem Ağu Eyl Eki Kas Ara"),
    "ko": ("날짜", "시간", "온도", "습도", "일련번호", "시작 시간", "기록 간격", "시간대", ".", None),
    "ja": ("日付", "時刻", "温度", "湿度", "シリアル番号", "開始時刻", "記録間隔", "タイムゾーン", ".", None),
    "zh": ("日期", "时间", "温度", "湿度", "序列号", "开始时间", "记录间隔", "时区", ".", None),
    "he": ("תאריך", "שעה", "טמפרטורה", "לחות", "מספר סידורי", "התחלה", "מרווח", "אזור זמן", ".", None),
    "ar": ("التاريخ", "الوقت", "درجة الحرارة", "الرطوبة", "الرقم التسلسلي", "البداية", "الفاصل الزمني", "المنطقة الزمنية", ".", None),
    "th": ("วันที่", "เวลา", "อุณหภูมิ", "ความชื้น", "หมายเลขเครื่อง", "เวลาเริ่ม", "ช่วงเวลา", "เขตเวลา", ".", None),
    "vi": ("Ngày", "Giờ", "Nhiệt độ", "Độ ẩm", "Số sê-ri", "Bắt đầu", "Khoảng thời gian", "Múi giờ", ",", None),
    "id": ("Tanggal", "Waktu", "Suhu", "Kelembaban", "Nomor seri", "Waktu mulai", "Interval", "Zona waktu", ",", "Jan Feb Mar Apr Mei Jun Jul Agt Sep Okt Nov Des"),
}
for k, (lang, (date, time, temp, hum, serial, start, interval, zone, sign, months)) in enumerate(L.items()):
    t = trace(seed=k, base=30 if k % 2 else -180)
    day, clock = (lambda at: at.strftime("%d.%m.%Y")), (lambda at: at.strftime("%H:%M"))
    add(f"{lang}: humidity is told from temperature by its word", [f"{date};{time};{temp};{hum}"] + [f"{day(at)};{clock(at)};{c(v, sign)};8{i % 10}{sign}5" for i, (at, v) in enumerate(t)],
        t, asked="unit", answers={"unit": "Cel"}, choices=["Cel", "[degF]"], channels=[[temp, "temperature"], [hum, "humidity"]])
    add(f"{lang}: start and interval stand above rows without times", [f"{serial}: A-{k}17", f"{start}: {day(t[0][0])} {clock(t[0][0])}", f"{interval}: 10 min", "", f"{temp} °C"] + [c(v, sign) for _, v in t], t)
    ahead = [(at + timedelta(hours=2), v) for at, v in t]
    add(f"{lang}: the zone stands above", [f"{zone}: UTC+02:00", "", f"{date};{time};{temp} °C"] + [f"{day(at)};{clock(at)};{c(v, sign)}" for at, v in ahead], t, lacks=["zone-assumed"])
    for month in range(1, 13) if months else []:
        m = trace(4, D(2026 if month < 3 else 2025, month, 9, 20, tzinfo=UTC), 7200, month)
        add(f"{lang}: month {month} by its name", [f"{date} {time};{temp} °C"] + [f"{at.day} {months.split()[at.month - 1]} {at.year} {clock(at)};{c(v, sign)}" for at, v in m], m)

# Names that are two months.
july = trace(6, D(2025, 7, 9, 20, tzinfo=UTC), 3600, 3)
july_as_june = [(at.replace(month=6), v) for at, v in july]
rows = [f"{at.day} lip {at.year} {at:%H:%M};{c(v)}" for at, v in july]
add("lip without another word is July", ["Time;Temp °C"] + rows, july, asked="start", answers={"start": iso(july[0][0])}, choices=[iso(july[0][0]), iso(july_as_june[0][0])])
add("lip without another word is June", ["Time;Temp °C"] + rows, july_as_june, asked="start", answers={"start": iso(july_as_june[0][0])})
over = trace(8, D(2025, 6, 30, 20, tzinfo=UTC), 3600, 3)
names = {6: "lip", 7: "srp"}
add("lip before srp is June before July", ["Time;Temp °C"] + [f"{at.day} {names[at.month]} {at.year} {at:%H:%M};{c(v)}" for at, v in over], over)
autumn = trace(8, D(2025, 10, 31, 20, tzinfo=UTC), 3600, 3)
names = {10: "lis", 11: "stu"}
add("lis before stu is October before November", ["Time;Temp °C"] + [f"{at.day} {names[at.month]} {at.year} {at:%H:%M};{c(v)}" for at, v in autumn], autumn)
add("lip with a start that is written out", ["Start: 2025-07-09 20:00", "", "Time;Temp °C"] + rows, july)

# Summer time, zones nobody knows, zones that differ.
summer = trace(start=D(2025, 7, 14, 9, 20, tzinfo=UTC))
winter = trace(start=D(2026, 1, 14, 9, 20, tzinfo=UTC))
def local(pairs, hours):
    return ["Time;Temp °C"] + [f"{at + timedelta(hours=hours):%Y-%m-%d %H:%M};{c(v)}" for at, v in pairs]
for words in ["Daylight saving: on", "DST: yes", "Daylight Saving Time: active", "Summer time: Yes", "Sommerzeit: ja", "Heure d'été: oui", "夏时制: 是"]:
    add(f"UTC+1 with {words} in summer", ["Time zone: UTC+1", words, ""] + local(summer, 2), summer, asked="zone", answers={"zone": "+02:00"}, choices=["+01:00", "+02:00"])
    add(f"UTC+1 with {words} in winter", ["Time zone: UTC+1", words, ""] + local(winter, 1), winter)
for words in ["Daylight saving: off", "DST: no", "Summer time: 0", "Sommerzeit: nein"]:
    add(f"UTC+1 with {words} in summer", ["Time zone: UTC+1", words, ""] + local(summer, 1), summer)
add("UTC+1 with DST in its own line", ["Time zone: UTC+1 (DST on)", ""] + local(summer, 2), summer, asked="zone", answers={"zone": "+02:00"})
for name in ["Zone 7", "XQZ", "Mars/Phobos", "Depot North"]:
    add(f"a zone called {name}", [f"Time zone: {name}", ""] + local(summer, 2), summer, asked="zone", answers={"zone": "+02:00"}, site="Europe/Amsterdam")
for name in ["local", "Ortszeit", "N/A", "-", "device"]:
    add(f"a zone called {name}", [f"Time zone: {name}", ""] + local(summer, 2), summer, site="Europe/Berlin", says=["zone-assumed"])
add("two zones that differ", ["Device time zone: UTC+2", "Report time zone: UTC+0", ""] + local(summer, 2), summer, asked="zone", answers={"zone": "+02:00"}, choices=["+02:00", "+00:00"])
add("an offset of three digits", ["Time zone offset: -300", ""] + local(summer, -5), summer, asked="zone", answers={"zone": "-05:00"}, choices=["-05:00", "-03:00"])
for line in ["Clock: UTC+02:00", "Logger clock set to Europe/Berlin", "Uhrzeit in UTC+2", "Hours shown: GMT+2"]:
    add(f"a zone said as {line}", [line, ""] + local(summer, 2), summer)
add("the zone of an export's own moment", ["Exported: 30.04.2026 10:11 UTC+5", ""] + local(summer, 2), summer, site="Europe/Berlin", says=["zone-assumed"])

add("the bracketed zone of an export's own moment", ["Printed 2026-04-30 10:00 (UTC+3) by office", ""] + local(summer, 2), summer, site="Europe/Berlin", says=["zone-assumed"])
add("a zone in the row of units", ["Channel 1", "Time;Value", "UTC;°C"] + local(summer, 0)[1:], summer, site="Europe/Berlin", lacks=["zone-assumed"])
for name in ["UTC±0", "UTC0", "GMT+0", "UTC +00:00"]:
    add(f"a zone called {name}", [f"Time zone: {name}", ""] + local(summer, 0), summer, site="Europe/Berlin", lacks=["zone-assumed"])
april = trace(8, D(2026, 4, 3, 6, tzinfo=UTC))
add("days up to 12 beside a written end", ["Time;Temp °C"] + [f"{at:%d/%m/%Y %H:%M};{c(v)}" for at, v in april] + ["", "Finished;3 April 2026 07:10"], april)

# Counts without a unit, and rows without times.
t = trace(n=20)
start, end = "Start: 14/03/2026 09:20:00", f"End: {t[-1][0]:%d/%m/%Y %H:%M:%S}"
minutes = ["Elapsed;Temp °C"] + [f"{10 * i};{c(v)}" for i, (_, v) in enumerate(t)]
seconds = ["Elapsed;Temp °C"] + [f"{600 * i};{c(v)}" for i, (_, v) in enumerate(t)]
plain = ["No;Temp °C"] + [f"{i + 1};{c(v)}" for i, (_, v) in enumerate(t)]
answer = {"start": "2026-03-14T09:20:00Z"}
add("counts with a stated interval", [start, "Interval: 10 min", ""] + minutes, t)
add("counts of seconds with a stated interval", [start, "Interval: 00:10:00", ""] + seconds, t)
add("counts between start and end", [start, end, ""] + minutes, t)
add("counts of seconds between start and end", [start, end, ""] + seconds, t)
add("counts with a start alone", [start, ""] + minutes, t, asked="intervalSeconds", answers={"intervalSeconds": "600"}, choices=["600", "10"])
add("counts with nothing", minutes, t, answers={"intervalSeconds": "600", **answer})
add("rows between start and end", [start, end, ""] + plain, t)
add("rows with a start alone", [start, ""] + plain, t, asked="intervalSeconds", answers={"intervalSeconds": "600"}, choices=["600"])
add("rows with an interval and an end", [end, "Interval: 10 min", ""] + plain, t, asked="start", answers=answer, choices=[iso(t[0][0])])
add("rows with a start that is only a day", ["Start date: 14/03/2026", "Interval: 10 min", ""] + plain, t, asked="start", answers=answer)
add("rows with two intervals of which one is of the readings", ["Transmission interval: 60 min", "Logging interval: 10 min", start, ""] + plain, t)
add("rows with two intervals that differ", ["Interval 1: 10 min", "Interval 2: 30 min", start, ""] + plain, t, asked="intervalSeconds", answers={"intervalSeconds": "600"}, choices=["600", "1800"])
for said in ["0h 10m 0s", "00h10m00s", "10 мин", "10 分", "10 dk", "0 days 00:10:00", "10 perc", "10 λεπτά", "10분", "600 с"]:
    add(f"an interval of {said}", [start, f"Logging interval: {said}", ""] + plain, t)
for said in ["Activated: 14/03/2026 09:20", "First logged; 14-Mar-2026 09:20:00", "Start timestamp: 1773480000", "Startdatum; 14-03-2026\nStarttijd; 09:20", "Starttime; 09:20\nStartdate; 14-03-2026"]:
    add(f"a start of {said!r}", said.split("\n") + ["Interval: 10 min", ""] + plain, t)

# A date that is damaged is no date of the rows that leave theirs blank below it.
bad = [(at, v) for i, (at, v) in enumerate(t) if not 5 <= i <= 8]
cells = ["14/03/2026" if i in (0, 9) else "14/0x/202" if i == 5 else "" for i in range(20)]
add("blank dates below a damaged one", ["Date;Time;Temp °C"] + [f"{cells[i]};{at:%H:%M};{c(v)}" for i, (at, v) in enumerate(t)], bad, says=["bad-time"])
# Sensors that are silent leave the delimiter alone.
some = [(at, v) for i, (at, v) in enumerate(t) if i not in (3, 4, 11)]
add("silent rows beside named months", ["Time zone: UTC-05:00", "Time;Temp °C;Note"] + [f"{(at - timedelta(hours=5)).day} Mar 2026 {at - timedelta(hours=5):%H:%M};{'---' if i in (3, 4, 11) else c(v)};ok" for i, (at, v) in enumerate(t)], some, missing=3)
add("whole rows in quotes", ['"Time;Temp °C"'] + [f'"{at:%Y-%m-%dT%H:%M:%SZ};{c(v)}"' for at, v in t], t)
add("a unit of humidity beside each figure", [f"{at:%Y-%m-%dT%H:%M:%SZ},{c(v)}°C,8{i % 10}.5%" for i, (at, v) in enumerate(t)], t)
add("year, month and day beside a clock", ["Year,Month,Day,Time,Temp °C"] + [f"{at.year},{at.month},{at.day},{at:%H:%M},{c(v)}" for at, v in t], t)

with open("tests/accuracy/export-cases.json", "w", encoding="utf-8") as out:
    json.dump(cases, out, ensure_ascii=False, indent="\t")
    out.write("\n")
print(len(cases), "cases")
