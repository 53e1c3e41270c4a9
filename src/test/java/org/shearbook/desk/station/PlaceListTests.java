package org.shearbook.desk.station;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;

class PlaceListTests {

    private static PlaceList read(String text) {
        return PlaceList.read(text.getBytes(StandardCharsets.UTF_8));
    }

    private static List<ListRefused.LineRefusal> refusals(String text) {
        try {
            read(text);
        } catch (ListRefused refused) {
            return refused.refusals();
        }
        throw new AssertionError("not refused");
    }

    @Test
    void theDesksOwnLayoutGivesSeveralIdentifiersOfOneStation() {
        PlaceRow row = read("""
                identifier,kind,name,latitude_deg,longitude_deg,elevation_m,magnetic_variation_east_deg
                xvke 00102 0-999-1-S102,station,Kelbrith,47.2,-30.0,50,-12.5
                """).rows().get(0);
        assertThat(row.identifiers()).containsExactly("XVKE", "00102", "0-999-1-S102");
        assertThat(row.kind()).isEqualTo("STATION");
        assertThat(row.latitude()).isEqualTo(47.2);
        assertThat(row.elevation()).isEqualTo(50);
        assertThat(row.magneticVariationEast()).isEqualTo(-12.5);
        assertThat(row.line()).isEqualTo(2);
    }

    @Test
    void thePublishedAerodromeLayoutGivesEveryCodeOfTheAerodromeAndFeetBecomeMetres() {
        PlaceRow row = read("""
                "id","ident","type","name","latitude_deg","longitude_deg","elevation_ft","gps_code","iata_code","local_code"
                7,"XVKX","medium_airport","Kelbrith, West","47.2","-30.1","1000","XVKX","KBX",""
                """).rows().get(0);
        assertThat(row.identifiers()).containsExactly("XVKX", "KBX");
        assertThat(row.name()).isEqualTo("Kelbrith, West");
        assertThat(row.elevation()).isCloseTo(304.8, within(1e-9));
        assertThat(row.magneticVariationEast()).isNaN();
    }

    @Test
    void theRadialsOfABeaconFollowItsSlavedVariationWhereThatIsGiven() {
        PlaceList list = read("""
                ident,type,name,latitude_deg,longitude_deg,elevation_ft,slaved_variation_deg,magnetic_variation_deg
                KEB,VORTAC,Kelbrith,47.2,-30.0,,-10,-12.5
                OSF,NDB,Ossenfell,45.3,-30.4,,,-11.75
                """);
        assertThat(list.rows()).extracting(PlaceRow::magneticVariationEast).containsExactly(-10.0, -11.75);
    }

    @Test
    void theArchivesStationListIsReadByItsColumnsAndItsBlockNumberIsASecondIdentifier() {
        // layout as published by the archive, values made here; -98.8888 marks a station that moves
        PlaceList list = read("""
                XVM00000102  47.2000  -30.0000   50.0    KELBRITH                       1957 2026  13896
                XVXUAX05467  25.2500   55.3700 -999.9    DRIFTER BASE                   1935 1942   2477
                ZZV000AXVES -98.8888 -998.8888 -998.8    SHIP                           1935 1942   2477
                """);
        assertThat(list.rows()).hasSize(2);
        assertThat(list.rows().get(0).identifiers()).containsExactly("XVM00000102", "00102");
        assertThat(list.rows().get(0).name()).isEqualTo("KELBRITH");
        assertThat(list.rows().get(1).identifiers()).containsExactly("XVXUAX05467");
        assertThat(list.rows().get(1).elevation()).isNaN();
        assertThat(list.leftOut()).isEqualTo(1);
    }

    @Test
    void aRowThatCannotBeRightIsNamedByLineAndColumn() {
        List<ListRefused.LineRefusal> refusals = refusals("""
                identifier,latitude_deg,longitude_deg
                A1,47.2,-30
                A2,147.2,-30
                A3,,
                A!4,10,10
                A5,10,"10,5"
                """);
        assertThat(refusals).extracting(r -> r.line() + " " + r.column() + " " + r.code()).containsExactly(
                "3 latitude_deg VALUE_OUT_OF_RANGE", "4 latitude_deg VALUE_MISSING", "4 longitude_deg VALUE_MISSING", "5 identifier IDENTIFIER",
                "6 longitude_deg VALUE_OUT_OF_RANGE");
    }

    @Test
    void anEmptyListAnUnknownHeaderAndNoiseAreRefused() {
        assertThat(refusals("")).extracting(ListRefused.LineRefusal::code).containsExactly("LIST_EMPTY");
        assertThat(refusals("identifier,latitude_deg,longitude_deg\n")).extracting(ListRefused.LineRefusal::code).containsExactly("LIST_EMPTY");
        assertThat(refusals("name,lat,lon\nA,1,2\n")).extracting(ListRefused.LineRefusal::code).containsExactly("HEADER_NOT_KNOWN");
        byte[] noise = new byte[5000];
        new java.util.Random(7).nextBytes(noise);
        assertThatThrownBy(() -> PlaceList.read(noise)).isInstanceOf(ListRefused.class);
        assertThat(refusals("identifier,latitude_deg,longitude_deg\n\"A,1,2\n")).isNotEmpty();
    }

    @Test
    void semicolonsTabsAndAByteOrderMarkAreUnderstood() {
        assertThat(read("\uFEFFidentifier;latitude_deg;longitude_deg\r\nA1;1;2\r\n").rows()).hasSize(1);
        assertThat(read("identifier\tlatitude_deg\tlongitude_deg\nA1\t1\t2\n").rows()).hasSize(1);
    }
}
