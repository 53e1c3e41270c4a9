package org.shearbook.desk.intake;

import java.nio.charset.StandardCharsets;
import java.security.SecureRandom;
import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.HashSet;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReportArchive;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.sounding.Arrived;
import org.shearbook.desk.sounding.Kept;
import org.shearbook.desk.sounding.SoundingArchive;
import org.shearbook.desk.station.FixTable;
import org.shearbook.desk.station.StationBook;
import org.shearbook.met.decode.DecodedAirReport;
import org.shearbook.met.decode.DecodedMessage;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.Decoding;
import org.shearbook.met.decode.DecodingContext;
import org.shearbook.met.decode.FixLookup;
import org.shearbook.met.decode.MessageDecoders;
import org.shearbook.met.decode.Rejection;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.context.ApplicationEventPublisher;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionTemplate;

/**
 * The one door for bytes. What comes in is decoded first, without a transaction; then everything that could be read
 * is kept in one transaction with one entry in the audit chain, and what could not be read is kept raw beside it for
 * a person. One bad message never stops the others: what can't be read is queued, and if keeping fails, which it
 * never should, the messages that make it fail are found by trying halves and queued as well.
 */
@Service
public class IntakeDoor {

    private static final Logger log = LoggerFactory.getLogger(IntakeDoor.class);
    private static final int SALT_BYTES = 16;
    private static final int MOST_LINES = 500_000;
    private static final String TOO_MANY_LINES = "This has more than %d lines, more than one arrival may hold. Nothing of it was kept. Send it in parts.".formatted(MOST_LINES);
    private static final int LONGEST_NAME = 200;
    private static final int LONGEST_FORMAT = 40;

    private final SoundingArchive soundings;
    private final AirReportArchive airReports;
    private final StationBook stations;
    private final IntakeRows rows;
    private final AuditTrail audit;
    private final TransactionTemplate transaction;
    private final ApplicationEventPublisher events;
    private final Clock clock;
    private final MessageDecoders decoders = MessageDecoders.all();
    private final SecureRandom random = new SecureRandom();

    IntakeDoor(SoundingArchive soundings, AirReportArchive airReports, StationBook stations, IntakeRows rows, AuditTrail audit, TransactionTemplate transaction,
            ApplicationEventPublisher events, Clock clock) {
        this.soundings = soundings;
        this.airReports = airReports;
        this.stations = stations;
        this.rows = rows;
        this.audit = audit;
        this.transaction = transaction;
        this.events = events;
        this.clock = clock;
    }

    /** A message that could be read. */
    private record Readable(int arrival, String format, DecodedMessage message) {
    }

    /** What could not be read; {@code raw} is null where the whole arrival is meant. */
    private record Unreadable(int arrival, int line, int column, String code, String text, byte @Nullable [] raw) {
    }

    /** One arrival and its salt: the same in every attempt to keep the batch. */
    private record Salted(Arrival arrival, byte[] salt, String digest) {
    }

    private static final class Sorted {
        final List<Salted> arrivals = new ArrayList<>();
        final List<String> formats = new ArrayList<>();
        final List<Readable> readable = new ArrayList<>();
        final List<Unreadable> unreadable = new ArrayList<>();
        final List<Refused> refused = new ArrayList<>();
    }

    /**
     * Takes in what arrived, in one act.
     *
     * @return what became of each message
     */
    public TakenIn takeIn(Actor actor, List<Arrival> arrivals, Channel channel) {
        Instant receivedAt = clock.instant().truncatedTo(ChronoUnit.MICROS);
        Sorted sorted = sort(arrivals, receivedAt);
        try {
            return transaction.execute(status -> keep(actor, channel, sorted, sorted.readable, receivedAt));
        } catch (RuntimeException failed) {
            return keepTheRest(actor, channel, sorted, receivedAt, failed);
        }
    }

    /** Reads without keeping anything. */
    public Decoding decode(byte[] bytes) {
        Instant receivedAt = clock.instant();
        if (hasTooManyLines(bytes)) {
            return new Decoding("UNKNOWN", List.of(), List.of(new Rejection(1, 0, "TOO_MANY_LINES", TOO_MANY_LINES, "")));
        }
        String compression = ReceivedBytes.compression(bytes);
        if (compression != null) {
            return new Decoding("UNKNOWN", List.of(), List.of(new Rejection(1, 0, "COMPRESSED", compressed(compression), "")));
        }
        return decoders.decode(ReceivedBytes.readable(bytes), new DecodingContext(receivedAt, fixes()));
    }

    private Sorted sort(List<Arrival> arrivals, Instant receivedAt) {
        Sorted sorted = new Sorted();
        DecodingContext context = new DecodingContext(receivedAt, fixes());
        for (int k = 0; k < arrivals.size(); k++) {
            Arrival arrival = arrivals.get(k);
            byte[] salt = new byte[SALT_BYTES];
            random.nextBytes(salt);
            sorted.arrivals.add(new Salted(arrival, salt, Digests.of(salt, arrival.bytes())));
            Refused refused = refusal(k + 1, arrival);
            if (refused == null) {
                sorted.formats.add(read(k + 1, arrival, context, sorted));
            } else {
                sorted.refused.add(refused);
                sorted.formats.add("");
            }
        }
        return sorted;
    }

    private static @Nullable Refused refusal(int number, Arrival arrival) {
        if (arrival.bytes().length == 0) {
            return new Refused(number, name(arrival), "EMPTY_INPUT", "The input is empty. Send the message itself.");
        }
        if (arrival.bytes().length > Arrival.MOST_BYTES) {
            return new Refused(number, name(arrival), "TOO_LARGE", "This is more than one arrival may hold (64 MB). Send it in parts.");
        }
        if (hasTooManyLines(arrival.bytes())) {
            return new Refused(number, name(arrival), "TOO_MANY_LINES", TOO_MANY_LINES);
        }
        String compression = ReceivedBytes.compression(arrival.bytes());
        return compression == null ? null : new Refused(number, name(arrival), "COMPRESSED", compressed(compression));
    }

    /** A few bytes a line make millions of messages: one request must not hold the desk for minutes. */
    private static boolean hasTooManyLines(byte[] bytes) {
        int lines = 0;
        for (byte one : bytes) {
            if (one == '\n' && ++lines > MOST_LINES) {
                return true;
            }
        }
        return false;
    }

    private static String compressed(String compression) {
        return "This is a compressed file (%s). Unpack it and send the files in it, many at once if you like.".formatted(compression);
    }

    /** Decodes one arrival and gives the name of its format. */
    private String read(int number, Arrival arrival, DecodingContext context, Sorted sorted) {
        byte[] bytes = ReceivedBytes.readable(arrival.bytes());
        Decoding decoding;
        try {
            decoding = decoders.decode(bytes, context);
        } catch (RuntimeException failed) {
            log.error("A decoder failed on arrival {} of {} bytes; it was queued whole", number, bytes.length, failed);
            sorted.unreadable.add(new Unreadable(number, 1, 0, "DECODER_FAILED",
                    "The decoder failed on this input, which is a fault of the program. It is kept raw; tell the administrator, the log holds the cause.", null));
            return "UNKNOWN";
        }
        for (DecodedMessage message : decoding.messages()) {
            Unreadable open = incomplete(number, message);
            if (open == null) {
                sorted.readable.add(new Readable(number, decoding.format(), message));
            } else {
                sorted.unreadable.add(open);
            }
        }
        for (Rejection rejection : decoding.rejected()) {
            boolean whole = decoding.messages().isEmpty() && decoding.rejected().size() == 1;
            sorted.unreadable.add(new Unreadable(number, rejection.line(), rejection.column(), rejection.code(), rejection.text(),
                    whole ? null : rejection.raw().getBytes(StandardCharsets.UTF_8)));
        }
        return decoding.format();
    }

    /** A message that was read but can't be placed in time is for a person to complete. */
    private static @Nullable Unreadable incomplete(int arrival, DecodedMessage message) {
        byte[] raw = message.raw().getBytes(StandardCharsets.UTF_8);
        if (message instanceof DecodedSounding sounding && sounding.launchedAt() == null && sounding.nominalAt() == null) {
            return new Unreadable(arrival, message.line(), 0, "TIME_MISSING",
                    "The sounding says neither when it was released nor which hour it stands for. Add a line such as # launch_time=2031-03-12T11:15:00Z above the table and send it again.", raw);
        }
        if (message instanceof DecodedAirReport report && report.observedAt() == null) {
            return new Unreadable(arrival, message.line(), 0, "TIME_MISSING",
                    "The report does not say when it was observed. Add the time and send it again.", raw);
        }
        return null;
    }

    private FixLookup fixes() {
        FixTable table = stations.fixTable();
        return identifier -> table.find(identifier).stream().map(fix -> new FixLookup.Fix(fix.identifier(), fix.kind(), fix.latitude(), fix.longitude(),
                fix.magneticVariationEast())).toList();
    }

    private TakenIn keepTheRest(Actor actor, Channel channel, Sorted sorted, Instant receivedAt, RuntimeException failed) {
        if (sorted.readable.isEmpty() || !canBeKept(actor, channel, sorted, List.of(), receivedAt)) {
            // No message is to blame: the database is away, say.
            throw failed;
        }
        log.error("A batch of {} messages could not be kept whole; looking for the messages to blame", sorted.readable.size(), failed);
        List<Readable> culprits = Culprits.among(sorted.readable, some -> canBeKept(actor, channel, sorted, some, receivedAt));
        try {
            return keepWithout(culprits, actor, channel, sorted, receivedAt);
        } catch (RuntimeException again) {
            log.error("The batch could not be kept without {} of its messages either; all of it was queued", culprits.size(), again);
            return keepWithout(sorted.readable, actor, channel, sorted, receivedAt);
        }
    }

    private TakenIn keepWithout(List<Readable> culprits, Actor actor, Channel channel, Sorted sorted, Instant receivedAt) {
        Set<DecodedMessage> out = Collections.newSetFromMap(new IdentityHashMap<>());
        Sorted rest = new Sorted();
        rest.arrivals.addAll(sorted.arrivals);
        rest.formats.addAll(sorted.formats);
        rest.refused.addAll(sorted.refused);
        rest.unreadable.addAll(sorted.unreadable);
        for (Readable culprit : culprits) {
            out.add(culprit.message());
            rest.unreadable.add(new Unreadable(culprit.arrival(), culprit.message().line(), 0, "KEEPING_FAILED",
                    "The message was read but could not be kept, which is a fault of the program. It is kept raw; tell the administrator, the log holds the cause.",
                    culprit.message().raw().getBytes(StandardCharsets.UTF_8)));
        }
        sorted.readable.stream().filter(one -> !out.contains(one.message())).forEach(rest.readable::add);
        return transaction.execute(status -> keep(actor, channel, rest, rest.readable, receivedAt));
    }

    private boolean canBeKept(Actor actor, Channel channel, Sorted sorted, List<Readable> some, Instant receivedAt) {
        try {
            transaction.executeWithoutResult(status -> {
                status.setRollbackOnly();
                keep(actor, channel, sorted, some, receivedAt);
            });
            return true;
        } catch (RuntimeException failed) {
            return false;
        }
    }

    private TakenIn keep(Actor actor, Channel channel, Sorted sorted, List<Readable> readable, Instant receivedAt) {
        Accepted[] accepted = new Accepted[readable.size()];
        keepSoundings(actor, readable, receivedAt, accepted);
        Instant recordedAt = audit.recordingMoment();
        long batchId = rows.draw("intake_batch_seq");
        keepAirReports(actor, readable, receivedAt, batchId, accepted);
        List<Accepted> all = List.of(accepted);
        List<Queued> queued = queue(sorted, batchId);
        TakenIn taken = new TakenIn(batchId, all, queued, sorted.refused);
        write(actor, channel, sorted, taken, receivedAt, recordedAt);
        return taken;
    }

    /** What needs a person: one item for the same bytes, however often they come. */
    private List<Queued> queue(Sorted sorted, long batchId) {
        List<String> fingerprints = sorted.unreadable.stream()
                .map(one -> fingerprint(one, sorted.arrivals.get(one.arrival() - 1).arrival().bytes())).toList();
        Map<String, IntakeRows.Known> known = new HashMap<>(rows.known(new HashSet<>(fingerprints)));
        Map<String, IntakeRows.Known> added = new LinkedHashMap<>();
        List<Queued> queued = new ArrayList<>(sorted.unreadable.size());
        for (int k = 0; k < fingerprints.size(); k++) {
            Unreadable one = sorted.unreadable.get(k);
            IntakeRows.Known item = known.get(fingerprints.get(k));
            boolean duplicate = item != null;
            if (item == null) {
                item = new IntakeRows.Known(rows.draw("intake_item_seq"), 1);
                known.put(fingerprints.get(k), item);
                added.put(fingerprints.get(k), item);
            }
            queued.add(new Queued(item.recordId(), one.arrival(), one.line(), one.column(), one.code(), one.text(), duplicate));
        }
        rows.addFingerprints("queueItem", added, batchId);
        return queued;
    }

    private static String fingerprint(Unreadable one, byte[] arrival) {
        return Digests.of(one.code().getBytes(StandardCharsets.US_ASCII), one.raw() == null ? arrival : one.raw());
    }

    private void keepSoundings(Actor actor, List<Readable> readable, Instant receivedAt, Accepted[] accepted) {
        List<Integer> places = new ArrayList<>();
        List<Arrived> arrived = new ArrayList<>();
        for (int k = 0; k < readable.size(); k++) {
            if (readable.get(k).message() instanceof DecodedSounding sounding) {
                places.add(k);
                arrived.add(new Arrived(sounding, readable.get(k).format()));
            }
        }
        List<Kept> kept = soundings.keepAll(actor, arrived, receivedAt);
        for (int k = 0; k < kept.size(); k++) {
            Readable one = readable.get(places.get(k));
            accepted[places.get(k)] = new Accepted(Accepted.SOUNDING, kept.get(k).id().value(), kept.get(k).version(), kept.get(k).duplicate(), one.arrival(),
                    one.message().line(), kept.get(k).remarks());
        }
    }

    /** The end of the chain is locked here, so nobody can keep the same report between the look and the writing. */
    private void keepAirReports(Actor actor, List<Readable> readable, Instant receivedAt, long batchId, Accepted[] accepted) {
        Map<Integer, String> fingerprints = new LinkedHashMap<>();
        for (int k = 0; k < readable.size(); k++) {
            if (readable.get(k).message() instanceof DecodedAirReport report) {
                fingerprints.put(k, fingerprint(report));
            }
        }
        if (fingerprints.isEmpty()) {
            return;
        }
        Map<String, IntakeRows.Known> known = new HashMap<>(rows.known(new HashSet<>(fingerprints.values())));
        Map<String, DecodedAirReport> fresh = new LinkedHashMap<>();
        fingerprints.forEach((place, fingerprint) -> {
            if (!known.containsKey(fingerprint)) {
                fresh.putIfAbsent(fingerprint, (DecodedAirReport) readable.get(place).message());
            }
        });
        List<org.shearbook.desk.airreport.Kept> kept = airReports.keepAll(actor, List.copyOf(fresh.values()), receivedAt);
        Map<String, IntakeRows.Known> added = new LinkedHashMap<>();
        int next = 0;
        for (String fingerprint : fresh.keySet()) {
            added.put(fingerprint, new IntakeRows.Known(kept.get(next).id().value(), kept.get(next).version()));
            next++;
        }
        rows.addFingerprints(Accepted.AIR_REPORT, added, batchId);
        Set<String> said = new HashSet<>();
        fingerprints.forEach((place, fingerprint) -> {
            Readable one = readable.get(place);
            IntakeRows.Known record = added.getOrDefault(fingerprint, known.get(fingerprint));
            boolean duplicate = !added.containsKey(fingerprint) || !said.add(fingerprint);
            accepted[place] = new Accepted(Accepted.AIR_REPORT, record.recordId(), record.version(), duplicate, one.arrival(), one.message().line(),
                    duplicate ? List.of() : one.message().remarks());
        });
    }

    /** Of the bytes and the moment: the same words on another day are another report. */
    private static String fingerprint(DecodedAirReport report) {
        return Digests.of(report.observedAt() + "\n" + report.raw().strip());
    }

    private void write(Actor actor, Channel channel, Sorted sorted, TakenIn taken, Instant receivedAt, Instant recordedAt) {
        int duplicates = (int) taken.duplicates();
        String digest = digest(sorted, taken);
        rows.addBatch(new Batch(taken.batchId(), channel.name(), actor.username(), sorted.arrivals.size(), taken.accepted().size(), duplicates, taken.queued().size(),
                taken.refused().size(), digest, receivedAt, recordedAt));
        int[] acceptedOf = new int[sorted.arrivals.size() + 1];
        int[] queuedOf = new int[sorted.arrivals.size() + 1];
        taken.accepted().forEach(one -> acceptedOf[one.arrival()]++);
        taken.queued().forEach(one -> queuedOf[one.arrival()]++);
        Map<Integer, Refused> refused = new HashMap<>();
        taken.refused().forEach(one -> refused.put(one.arrival(), one));
        for (int k = 0; k < sorted.arrivals.size(); k++) {
            Salted salted = sorted.arrivals.get(k);
            Refused refusal = refused.get(k + 1);
            String format = sorted.formats.get(k);
            rows.addArrival(taken.batchId(), new Batch.Part(k + 1, name(salted.arrival()), salted.arrival().bytes().length,
                    format.substring(0, Math.min(LONGEST_FORMAT, format.length())), acceptedOf[k + 1], queuedOf[k + 1],
                    refusal == null ? null : refusal.code(), refusal == null ? null : refusal.text()), salted.digest());
            if (refusal == null) {
                rows.addRaw(taken.batchId(), k + 1, salted.salt(), salted.arrival().bytes());
            }
        }
        rows.addRecords(taken.batchId(), taken.accepted());
        List<Queued> newItems = new ArrayList<>();
        List<byte @Nullable []> raws = new ArrayList<>();
        for (int k = 0; k < taken.queued().size(); k++) {
            if (!taken.queued().get(k).duplicate()) {
                newItems.add(taken.queued().get(k));
                raws.add(sorted.unreadable.get(k).raw());
            }
        }
        rows.addItems(taken.batchId(), newItems, raws, receivedAt, recordedAt);
        events.publishEvent(new MessagesTakenIn(actor, taken.batchId(), taken.accepted().size(), duplicates, taken.queued().size(), taken.refused().size(), digest));
    }

    private static String digest(Sorted sorted, TakenIn taken) {
        StringBuilder lines = new StringBuilder();
        sorted.arrivals.forEach(one -> lines.append("arrival ").append(one.digest()).append('\n'));
        taken.accepted().forEach(one -> lines.append(one.kind()).append(' ').append(one.id()).append(' ').append(one.version()).append('\n'));
        taken.queued().forEach(one -> lines.append("item ").append(one.id()).append(' ').append(one.code()).append('\n'));
        return Digests.of(lines.toString());
    }

    private static String name(Arrival arrival) {
        StringBuilder name = new StringBuilder();
        arrival.name().chars().forEach(c -> name.append(c < ' ' || c == 0x7F ? ' ' : (char) c));
        String shown = name.toString().strip();
        return shown.isEmpty() ? "without a name" : shown.substring(0, Math.min(LONGEST_NAME, shown.length()));
    }
}
