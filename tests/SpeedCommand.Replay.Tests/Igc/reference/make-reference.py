#!/usr/bin/env python3
"""Makes flight.igc and receiver.log, two invented flights for the tests. Deterministic; needs nothing but Python."""
import math

KMH = 3.6


def position(t):
    """Latitude and longitude in thousandths of a minute: straight for 60 s, then circles of 24 s, and over the date line."""
    north, east = 28.0 * min(t, 60), 4.0 * t
    if t > 60:
        angle = 2 * math.pi * (t - 60) / 24
        north += 95 * math.sin(angle)
        east += 95 * (1 - math.cos(angle))
    lat = -1830000 + north / 1852 * 1000
    lon = 10799100 + east / 1852 * 1000 / math.cos(math.radians(30.5))
    lon = lon if lon < 10800000 else lon - 21600000
    return round(lat), round(lon)


def angle(thousandths, digits, letters):
    size = abs(thousandths)
    return "%0*d%05d%s" % (digits, size // 60000, size % 60000, letters[thousandths < 0])


def flight():
    lines = ["AXXX123REFERENCE", "HFDTEDATE:311226,01", "HFPLTPILOTINCHARGE:J\u00f6rg M\u00fcller", "HFGTYGLIDERTYPE:Marram 15",
             "HFGIDGLIDERID:X-123", "I053638IAS3943TAS4446OAT4749VAT5052ENL", "LXXXa comment", ""]
    for t in range(0, 240, 2):
        seconds = (86340 + t) % 86400
        lat, lon = position(t)
        height = 900 - t if t < 60 else 840 + round(2.1 * (t - 60))
        ias = 112 - (27 if t > 64 else 0)
        tas = round((ias / KMH) * 1.05 * KMH * 100)
        vat = -10 if t < 60 else 21
        clock = "%02d%02d%02d" % (seconds // 3600, seconds // 60 % 60, seconds % 60)
        lines.append("B%s%s%s%s%05d%05d%03d%05d%03d%s%03d" % (
            clock, angle(lat, 2, "NS"), angle(lon, 3, "EW"), "V" if t == 10 else "A", height, height + 41, ias, tas,
            14 - height // 200, "%03d" % vat if vat >= 0 else "-%02d" % -vat, 20 + t % 7))
    lines.append("G0000")
    with open("flight.igc", "w", encoding="utf-8", newline="") as file:
        file.write("".join(line + "\r\n" for line in lines))


def sentence(text):
    total = 0
    for character in text:
        total ^= ord(character)
    return "$%s*%02X" % (text, total)


def receiver():
    lines = []
    for i in range(0, 300):
        t = 0.1 * i
        if i % 2 == 0:
            lines.append((t + 0.012, "static", sentence("YXXDR,P,%.1f,P,STATIC" % (91000 + 12.0 * t))))
            lines.append((t + 0.021, "pitot", sentence("YXXDR,P,%.1f,P,IMPACT" % (420 + 6 * t))))
        if i % 20 == 4:
            lines.append((t + 0.031, "static", sentence("YXXDR,C,%.1f,C,OAT" % (-3.6 + 0.2 * t))))
        if i % 5 == 1:
            seconds = 36000 + t - 0.1
            lat, lon = position(seconds - 36000)
            clock = "1000%05.2f" % (seconds - 36000)
            def nmea(value, digits, letters):
                size = abs(value)
                return "%0*d%02d.%03d0,%s" % (digits, size // 60000, size % 60000 // 1000, size % 1000, letters[value < 0])
            where = nmea(lat, 2, "NS") + "," + nmea(lon, 3, "EW")
            lines.append((t + 0.040, "gnss", sentence("GNRMC,%s,A,%s,54.40,8.1,140626,,,A" % (clock, where))))
            lines.append((t + 0.055, "gnss", sentence("GNGGA,%s,%s,1,12,0.8,%.1f,M,41.0,M,," % (clock, where, 912.4 - t))))
    with open("receiver.log", "w", newline="\n") as file:
        file.write("#speedcommand-log 1\n#start 2026-06-14T09:59:58.000Z\n#glider marram-15.json\n#note made by make-reference.py\n")
        for t, stream, line in sorted(lines):
            file.write("%.6f %s %s\n" % (t, stream, line))
        file.write("#end 30.000000\n")


flight()
receiver()
