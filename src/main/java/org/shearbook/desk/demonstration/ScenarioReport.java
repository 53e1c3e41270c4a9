package org.shearbook.desk.demonstration;

import java.time.Duration;
import java.time.Instant;
import java.util.List;

/**
 * One air-report of the invented scenario.
 *
 * @param flightLevel pressure altitude [hundreds of feet]
 * @param intensity   NIL, LGT, MOD or SEV
 * @param edrPeak     [m^⅔ s⁻¹]; {@code NaN} for a voice report
 * @param automatic   sent by the aircraft itself; else by voice
 * @param special     a special air-report
 * @param remark      empty where there is none
 */
record ScenarioReport(
        String id, Instant observedAt, double latitude, double longitude, int flightLevel, String intensity, double edrPeak,
        boolean automatic, boolean special, String weightClass, String cloud, String remark) {

    private static final String TABLE = """
            R01 D1 0215 N4724 W03336 350 NIL -    AUTO  H CLR
            R02 D1 0540 N4706 W03018 370 NIL -    AUTO  H CLR
            R03 D1 0910 N4524 W03012 240 NIL -    VOICE M CLR smooth in climb
            R04 D1 1125 N4718 W03248 310 NIL 0.06 AUTO  H CLR
            R05 D1 1330 N4700 W02948 330 LGT 0.13 AUTO  M CLR
            R06 D1 1505 N4654 W02712 350 NIL 0.05 AUTO  H CLR
            R07 D1 1720 N4512 W03036 120 LGT -    VOICE M CLD in convective cloud tops - excluded from shear-layer scoring
            R08 D1 2140 N4730 W03312 300 NIL -    VOICE M CLR
            R09 D2 0218 N4736 W03324 300 MOD 0.27 AUTO  M CLR
            R10 D2 0242 N4724 W03242 340 NIL 0.07 AUTO  H CLR
            R11 D2 0305 N4730 W03300 300 MOD -    VOICE M CLR 5 min continuous
            R12 D2 0331 N4718 W03230 290 LGT 0.16 AUTO  H CLR
            R13 D2 0350 N4742 W03254 320 MOD 0.22 AUTO  M CLR 1000 ft above layer top
            R14 D2 0412 N4724 W03306 310 MOD 0.24 AUTO  M CLR
            R15 D2 0455 N4712 W03336 280 NIL 0.08 AUTO  H CLR
            R16 D2 0520 N4730 W03236 390 NIL -    VOICE H CLR
            R17 D2 0915 N4706 W03036 290 LGT 0.15 AUTO  M CLR
            R18 D2 0938 N4718 W03024 290 MOD 0.25 AUTO  M CLR
            R19 D2 1007 N4712 W03006 300 MOD 0.31 AUTO  M CLR
            R20 D2 1022 N4700 W02954 350 NIL 0.06 AUTO  H CLR
            R21 D2 1041 N4724 W02948 280 MOD -    VOICE M CLR rhythmic, about 20 s between bumps
            R22 D2 1058 N4712 W03012 290 MOD 0.34 AUTO  M CLD in cirrus
            R23 D2 1110 N4718 W03000 290 MOD 0.38 AUTO  M CLR
            R24 D2 1128 N4706 W02942 300 MOD -    VOICE M CLR wave cloud in sight ahead, curled crests
            R25 D2 1142 N4712 W03000 290 SEV 0.47 AUTO  M CLR special air-report; first of type
            R26 D2 1156 N4718 W02936 280 MOD 0.33 AUTO  H CLR
            R27 D2 1215 N4700 W03018 330 LGT 0.12 AUTO  H CLR
            R28 D2 1230 N4712 W02954 260 NIL -    VOICE M CLR descended out of it below FL270
            R29 D2 1247 N4724 W03006 310 LGT 0.17 AUTO  H CLR
            R30 D2 1035 N4518 W03030 170 MOD -    VOICE M CLR
            R31 D2 1102 N4524 W03018 175 MOD 0.29 AUTO  M CLR climbing
            R32 D2 1131 N4512 W03036 170 MOD -    VOICE L CLR
            R33 D2 1148 N4518 W03012 165 MOD 0.26 AUTO  M CLR descending
            R34 D2 1204 N4530 W03024 190 LGT 0.14 AUTO  M CLR
            R35 D2 1222 N4512 W03018 250 NIL 0.05 AUTO  M CLR
            R36 D2 1218 N4700 W02718 370 NIL 0.07 AUTO  H CLR
            R37 D2 1305 N4654 W02654 380 NIL 0.06 AUTO  H CLR
            R38 D2 1342 N4706 W02706 370 LGT 0.11 AUTO  H CLR
            R39 D2 1420 N4648 W02700 390 NIL -    VOICE H CLR
            R40 D2 1455 N4712 W02648 360 NIL 0.08 AUTO  H CLR
            R41 D2 1540 N4700 W02712 370 NIL 0.07 AUTO  H CLR
            R42 D2 1624 N4706 W02930 290 MOD 0.30 AUTO  M CLR
            R43 D2 1658 N4712 W02906 300 MOD 0.26 AUTO  M CLR
            R44 D2 1731 N4700 W02848 280 LGT 0.18 AUTO  H CLR
            R45 D2 1752 N4648 W02806 280 SEV 0.46 AUTO  M CLR special air-report; NOT acknowledged on shift
            R46 D2 1820 N4654 W02800 290 MOD 0.36 AUTO  M CLR
            R47 D2 1841 N4642 W02748 280 MOD -    VOICE M CLR
            R48 D2 1925 N4706 W02854 290 MOD 0.24 AUTO  M CLR
            R49 D2 2040 N4654 W02736 290 MOD 0.28 AUTO  M CLR
            R50 D2 2118 N4700 W02724 300 LGT 0.17 AUTO  H CLR
            R51 D2 2205 N4648 W02712 280 MOD 0.25 AUTO  M CLR
            R52 D2 2250 N4706 W02706 270 NIL 0.09 AUTO  H CLR
            R53 D2 2331 N4700 W02648 300 LGT 0.14 AUTO  H CLR
            R54 D3 0225 N4654 W02654 290 MOD 0.24 AUTO  M CLR
            R55 D3 0310 N4706 W02642 300 MOD -    VOICE M CLR
            R56 D3 0402 N4648 W02636 280 LGT 0.15 AUTO  H CLR
            R57 D3 0447 N4700 W02630 290 NIL 0.09 AUTO  H CLR
            R58 D3 0530 N4654 W02624 270 NIL 0.07 AUTO  H CLR
            R59 D3 0820 N4712 W02954 290 NIL -    VOICE M CLR
            R60 D3 1015 N4518 W03024 180 NIL 0.05 AUTO  M CLR
            R61 D3 1240 N4700 W02700 330 NIL 0.06 AUTO  H CLR
            """;

    private static final List<String> SPECIAL = List.of("R25", "R45");
    private static final List<String> AIRLINES = List.of("HRNX", "TRNX", "GULX", "PETX");

    /** All sixty-one, in the order of the scenario. */
    static final List<ScenarioReport> ALL = TABLE.lines().map(String::strip).filter(line -> !line.isEmpty()).map(ScenarioReport::read).toList();

    private static ScenarioReport read(String line) {
        String[] part = line.split(" +", 12);
        Instant day = ScenarioAscent.DAY_ONE.plus(Duration.ofDays(part[1].charAt(1) - '1'));
        Instant observedAt = day.plus(Duration.ofHours(Integer.parseInt(part[2].substring(0, 2)))).plus(Duration.ofMinutes(Integer.parseInt(part[2].substring(2))));
        return new ScenarioReport(part[0], observedAt, degrees(part[3]), -degrees(part[4]), Integer.parseInt(part[5]), part[6],
                part[7].equals("-") ? Double.NaN : Double.parseDouble(part[7]), part[8].equals("AUTO"), SPECIAL.contains(part[0]),
                part[9], part[10], part.length > 11 ? part[11] : "");
    }

    /** {@code N4724} to 47.4. */
    private static double degrees(String text) {
        int digits = text.length() - 2;
        return Integer.parseInt(text.substring(1, digits)) + Integer.parseInt(text.substring(digits)) / 60.0;
    }

    /** Automatic reports arrive a minute after the observation, voice reports six. */
    Instant receivedAt() {
        return observedAt.plus(Duration.ofMinutes(automatic ? 1 : 6));
    }

    /** Class of the report: special, automatic at a routine interval, or voluntary. */
    String reportClass() {
        return special ? "SPC" : automatic ? "EDR" : "VOL";
    }

    /** An identification that is never a valid operator code. */
    String aircraft() {
        int number = Integer.parseInt(id.substring(1));
        return AIRLINES.get(number % AIRLINES.size()) + (100 + number * 7);
    }
}
