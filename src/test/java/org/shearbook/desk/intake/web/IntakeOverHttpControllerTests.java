package org.shearbook.desk.intake.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.time.Duration;
import org.junit.jupiter.api.Test;
import org.shearbook.testing.OnDemonstration;
import org.springframework.boot.test.web.server.LocalServerPort;

/** The door over a real connection, where the server reads bodies before the application does. */
@OnDemonstration
class IntakeOverHttpControllerTests {

    @LocalServerPort
    int port;

    private HttpResponse<String> post(String path, String contentType, String body) throws Exception {
        return HttpClient.newHttpClient().send(HttpRequest.newBuilder(URI.create("http://127.0.0.1:" + port + "/api/v1/" + path)).timeout(Duration.ofSeconds(60))
                .header("Authorization", "Bearer ennersund-demo").header("Content-Type", contentType).POST(HttpRequest.BodyPublishers.ofString(body)).build(),
                HttpResponse.BodyHandlers.ofString());
    }

    @Test
    void aBodyThatAToolDeclaresAsAFormIsReadAsTheMessageItIs() throws Exception {
        String report = "XVKE UA /OV 4712N03000W/TM 0542/FL290/TP B738/TB MOD CHOP 280-300/RM B&C %41 FORM";
        for (String type : new String[] {"application/x-www-form-urlencoded", "application/x-www-form-urlencoded;charset=UTF-8", "text/plain", "application/octet-stream"}) {
            HttpResponse<String> decoded = post("decodings", type, report);
            assertThat(decoded.statusCode()).as(type).isEqualTo(200);
            assertThat(decoded.body()).as(type).contains("\"kind\":\"airReport\"").contains("B&C %41 FORM");
        }
        assertThat(post("messages", "application/x-www-form-urlencoded", report).body()).contains("\"accepted\":[{\"kind\":\"airReport\"");
        String csv = "# launch_time=2031-03-12T05:15:00Z\npressure_hPa,geopotential_height_m,temperature_C,wind_direction_deg,wind_speed_kt\n1004.3,87,9.2,240,14\n925,780,4.1,250,25\n"
                + "850,1480,0.2,255,31\n700,3010,-8.9,260,48\n";
        assertThat(post("profile-analyses?windowM=200", "application/x-www-form-urlencoded", csv).statusCode()).isEqualTo(200);
    }
}
