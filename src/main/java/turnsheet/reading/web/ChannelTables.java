package turnsheet.reading.web;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.capture.Looked;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.reading.CaptureChannels;
import turnsheet.reading.ChannelStanding;
import turnsheet.reading.ReadingId;
import turnsheet.reading.StoredReading;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/** Lays the channels of a recording out for the page of one of its readings. */
@Component
class ChannelTables {

  private static final List<FigureName> TOLD =
      List.of(
          FigureName.DEVIATION,
          FigureName.DRIFT,
          FigureName.WEIGHTED_TWO_SIGMA,
          FigureName.UNWEIGHTED_RMS);

  private final CaptureChannels channels;
  private final Captures captures;

  ChannelTables(CaptureChannels channels, Captures captures) {
    this.channels = channels;
    this.captures = captures;
  }

  /** Null where there is one channel only. */
  @Nullable ChannelTable of(StoredReading shown, Wording words) {
    List<ChannelStanding> standings = channels.of(shown.captureId());
    List<Recognised.Channel> names = names(shown.captureId());
    if (Math.max(standings.size(), names.size()) < 2) {
      return null;
    }
    int here = shown.reading().source().channel();
    ChannelStanding main =
        standings.stream().filter(ChannelStanding::main).findFirst().orElse(null);
    List<String> columns = new ArrayList<>();
    TOLD.forEach(name -> columns.add(words.nameOf(name) + ", " + name.unit()));
    columns.add(words.text("reading.channels.snr"));
    boolean beside = main != null && main.channel() != here;
    StoredReading mains = main == null || !beside ? null : main.reading();
    return new ChannelTable(
        main != null && beside
            ? words.text(
                "reading.channels.beside", Integer.toString(here), Integer.toString(main.channel()))
            : words.text("reading.channels.main", Integer.toString(here)),
        mains == null ? null : mains.id().toString(),
        names.size() > ChannelMeasurement.MOST_CHANNELS
            ? words.text(
                "reading.channels.more",
                Integer.toString(names.size()),
                Integer.toString(ChannelMeasurement.MOST_CHANNELS))
            : null,
        columns,
        standings.stream().map(s -> row(s, names, here, shown.id(), words)).toList());
  }

  private static ChannelTable.Row row(
      ChannelStanding standing,
      List<Recognised.Channel> names,
      int here,
      ReadingId shown,
      Wording words) {
    StoredReading stored = standing.reading();
    Rejection refusal = standing.refusal();
    String note =
        (standing.main() ? words.text("reading.channels.isMain") : "")
            + (standing.channel() == here ? words.text("reading.channels.isHere") : "");
    return new ChannelTable.Row(
        name(standing.channel(), names),
        note,
        stored == null || stored.id().equals(shown) ? null : stored.id().toString(),
        stored == null ? List.of() : figures(stored.reading(), words),
        refusal == null ? null : refusal.message());
  }

  private static List<Shown> figures(Reading reading, Wording words) {
    List<Shown> figures = new ArrayList<>();
    TOLD.forEach(name -> figures.add(words.show(name, name.of(reading))));
    figures.add(
        words.numbers().show(reading.signal().snrDb(), "dB", turnsheet.web.Numbers.Sign.PLAIN));
    return figures;
  }

  /** The number, and what the file calls the channel where that says more. */
  private static String name(int channel, List<Recognised.Channel> names) {
    String number = Integer.toString(channel);
    if (channel > names.size()) {
      return number;
    }
    String name = names.get(channel - 1).name();
    return name.equals("channel " + number) ? number : number + ": " + name;
  }

  private List<Recognised.Channel> names(CaptureId id) {
    Looked looked = captures.find(id).map(Capture::looked).orElse(null);
    return looked == null ? List.of() : looked.recognised().channels();
  }
}
