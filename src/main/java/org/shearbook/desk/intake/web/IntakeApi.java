package org.shearbook.desk.intake.web;

import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;
import org.shearbook.desk.intake.Accepted;
import org.shearbook.desk.intake.Arrival;
import org.shearbook.desk.intake.Channel;
import org.shearbook.desk.intake.IntakeDoor;
import org.shearbook.desk.intake.TakenIn;
import org.shearbook.desk.shell.Problem;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedMessage;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.Remark;
import org.springframework.http.HttpStatus;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestPart;
import org.springframework.web.bind.annotation.RestController;
import org.springframework.web.multipart.MultipartFile;

/** The door for scripts: the body is the message or the messages, whatever its content type says. */
@RestController
@RequestMapping("/api/v1")
class IntakeApi {

    private final IntakeDoor door;
    private final SoundingArchive soundings;
    private final CurrentActor actor;

    IntakeApi(IntakeDoor door, SoundingArchive soundings, CurrentActor actor) {
        this.door = door;
        this.soundings = soundings;
        this.actor = actor;
    }

    @PostMapping("/messages")
    TakenInView takeIn(InputStream body) throws IOException {
        return TakenInView.of(door.takeIn(actor.get(), List.of(new Arrival("request body", read(body))), Channel.HTTP));
    }

    @PostMapping(path = "/messages", consumes = "multipart/form-data")
    TakenInView takeInFiles(@RequestPart("file") List<MultipartFile> files) throws IOException {
        List<Arrival> arrivals = new ArrayList<>();
        for (MultipartFile file : files) {
            arrivals.add(new Arrival(String.valueOf(file.getOriginalFilename()), file.getBytes()));
        }
        return TakenInView.of(door.takeIn(actor.get(), arrivals, Channel.HTTP));
    }

    @PostMapping("/decodings")
    DecodingView decode(InputStream body) throws IOException {
        Decoding decoding = door.decode(read(body));
        return new DecodingView(decoding.format(), decoding.messages().stream().map(this::view).toList(),
                decoding.rejected().stream().map(one -> new RejectedView(one.line(), one.column(), one.code(), one.text())).toList());
    }

    private DecodedView view(DecodedMessage message) {
        if (message instanceof DecodedSounding sounding) {
            return DecodedView.Sounding.of(sounding, soundings.levels(sounding));
        }
        return DecodedView.AirReport.of((DecodedAirReport) message);
    }

    /** Not as a parameter of the call: a body sent as a form must not be taken apart. */
    private static byte[] read(InputStream body) throws IOException {
        byte[] bytes = body.readNBytes(Arrival.MOST_BYTES + 1);
        if (bytes.length > Arrival.MOST_BYTES) {
            throw new TooLarge();
        }
        return bytes;
    }

    private static final class TooLarge extends RuntimeException {
        private static final long serialVersionUID = 1L;
    }

    @ExceptionHandler(TooLarge.class)
    ResponseEntity<ProblemDetail> tooLarge() {
        return ResponseEntity.status(HttpStatus.CONTENT_TOO_LARGE).body(Problem.of(HttpStatus.CONTENT_TOO_LARGE, "TOO_LARGE",
                "This is more than one request may hold (64 MB). Nothing was kept. Send it in parts."));
    }

    /** @param rejected not kept at all; what is kept for a person to look at is queued */
    record TakenInView(long batchId, List<AcceptedView> accepted, List<QueuedView> queued, List<RejectedView> rejected) {

        static TakenInView of(TakenIn taken) {
            return new TakenInView(taken.batchId(), taken.accepted().stream().map(AcceptedView::of).toList(),
                    taken.queued().stream().map(one -> new QueuedView(one.id(), one.code() + ": " + one.text(), one.line(), one.column(), one.code(), one.text(), one.duplicate())).toList(),
                    taken.refused().stream().map(one -> new RejectedView(1, 0, one.code(), one.text())).toList());
        }
    }

    record AcceptedView(String kind, long id, int version, boolean duplicate, int line, List<Remark> remarks) {

        static AcceptedView of(Accepted one) {
            return new AcceptedView(one.kind(), one.id(), one.version(), one.duplicate(), one.line(), one.remarks());
        }
    }

    record QueuedView(long id, String reason, int line, int column, String code, String text, boolean duplicate) {
    }

    record RejectedView(int line, int column, String code, String text) {
    }

    record DecodingView(String format, List<DecodedView> messages, List<RejectedView> rejected) {
    }
}
