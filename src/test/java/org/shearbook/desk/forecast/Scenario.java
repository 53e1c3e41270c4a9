package org.shearbook.desk.forecast;

import java.time.Instant;
import java.util.List;

/** The forecasts and reports of the invented three days, as far as inside and outside go. */
final class Scenario {

    record Report(String name, Instant at, double latitude, double longitude, double flightLevel, String intensity) {
    }

    private record Standing(Instant from, Instant until, ForecastContent content) {
    }

    static final List<Report> REPORTS = """
            R01 11T02:15 4724 03336 350 NIL
            R02 11T05:40 4706 03018 370 NIL
            R03 11T09:10 4524 03012 240 NIL
            R04 11T11:25 4718 03248 310 NIL
            R05 11T13:30 4700 02948 330 LGT
            R06 11T15:05 4654 02712 350 NIL
            R07 11T17:20 4512 03036 120 LGT
            R08 11T21:40 4730 03312 300 NIL
            R09 12T02:18 4736 03324 300 MOD
            R10 12T02:42 4724 03242 340 NIL
            R11 12T03:05 4730 03300 300 MOD
            R12 12T03:31 4718 03230 290 LGT
            R13 12T03:50 4742 03254 320 MOD
            R14 12T04:12 4724 03306 310 MOD
            R15 12T04:55 4712 03336 280 NIL
            R16 12T05:20 4730 03236 390 NIL
            R17 12T09:15 4706 03036 290 LGT
            R18 12T09:38 4718 03024 290 MOD
            R19 12T10:07 4712 03006 300 MOD
            R20 12T10:22 4700 02954 350 NIL
            R21 12T10:41 4724 02948 280 MOD
            R22 12T10:58 4712 03012 290 MOD
            R23 12T11:10 4718 03000 290 MOD
            R24 12T11:28 4706 02942 300 MOD
            R25 12T11:42 4712 03000 290 SEV
            R26 12T11:56 4718 02936 280 MOD
            R27 12T12:15 4700 03018 330 LGT
            R28 12T12:30 4712 02954 260 NIL
            R29 12T12:47 4724 03006 310 LGT
            R30 12T10:35 4518 03030 170 MOD
            R31 12T11:02 4524 03018 175 MOD
            R32 12T11:31 4512 03036 170 MOD
            R33 12T11:48 4518 03012 165 MOD
            R34 12T12:04 4530 03024 190 LGT
            R35 12T12:22 4512 03018 250 NIL
            R36 12T12:18 4700 02718 370 NIL
            R37 12T13:05 4654 02654 380 NIL
            R38 12T13:42 4706 02706 370 LGT
            R39 12T14:20 4648 02700 390 NIL
            R40 12T14:55 4712 02648 360 NIL
            R41 12T15:40 4700 02712 370 NIL
            R42 12T16:24 4706 02930 290 MOD
            R43 12T16:58 4712 02906 300 MOD
            R44 12T17:31 4700 02848 280 LGT
            R45 12T17:52 4648 02806 280 SEV
            R46 12T18:20 4654 02800 290 MOD
            R47 12T18:41 4642 02748 280 MOD
            R48 12T19:25 4706 02854 290 MOD
            R49 12T20:40 4654 02736 290 MOD
            R50 12T21:18 4700 02724 300 LGT
            R51 12T22:05 4648 02712 280 MOD
            R52 12T22:50 4706 02706 270 NIL
            R53 12T23:31 4700 02648 300 LGT
            R54 13T02:25 4654 02654 290 MOD
            R55 13T03:10 4706 02642 300 MOD
            R56 13T04:02 4648 02636 280 LGT
            R57 13T04:47 4700 02630 290 NIL
            R58 13T05:30 4654 02624 270 NIL
            R59 13T08:20 4712 02954 290 NIL
            R60 13T10:15 4518 03024 180 NIL
            R61 13T12:40 4700 02700 330 NIL
            """.lines().map(line -> line.strip().split(" ")).map(cells -> new Report(cells[0], at(cells[1]), degrees(cells[2]), -degrees(cells[3]),
                    Double.parseDouble(cells[4]), cells[5])).toList();

    /** While which version stood, and its box. */
    private static final List<Standing> FORECASTS = List.of(
            standing("12T02:00", "12T06:00", "4654", "4800", "03354", "03212", 280, 310),
            standing("12T09:00", "12T13:00", "4642", "4742", "03048", "02924", 270, 310),
            standing("12T13:00", "12T16:00", "4630", "4730", "02736", "02630", 360, 390),
            standing("12T16:00", "12T19:05", "4642", "4742", "02954", "02830", 260, 310),
            standing("12T19:05", "12T20:00", "4630", "4742", "02954", "02736", 260, 310),
            standing("12T20:00", "12T23:59", "4630", "4730", "02800", "02642", 260, 310),
            standing("13T02:00", "13T06:00", "4630", "4730", "02712", "02618", 260, 300));

    private Scenario() {
    }

    static boolean inside(Report report) {
        return FORECASTS.stream().anyMatch(standing -> standing.content().covers(report.latitude(), report.longitude(), report.flightLevel(), report.at()));
    }

    private static Standing standing(String from, String until, String south, String north, String west, String east, int base, int top) {
        ForecastContent sample = ForecastSamples.withArea(ForecastSamples.moderate(at(from)),
                Area.box(degrees(south), degrees(north), -degrees(west), -degrees(east)));
        return new Standing(at(from), at(until), ForecastSamples.withTimes(ForecastSamples.withLevels(sample, base, top), at(from), at(until)));
    }

    private static Instant at(String dayAndTime) {
        return Instant.parse("2031-03-" + dayAndTime + ":00Z");
    }

    private static double degrees(String degreesMinutes) {
        int split = degreesMinutes.length() - 2;
        return Integer.parseInt(degreesMinutes.substring(0, split)) + Integer.parseInt(degreesMinutes.substring(split)) / 60.0;
    }
}
