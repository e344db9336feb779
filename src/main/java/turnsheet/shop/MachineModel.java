package turnsheet.shop;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.Kinematics;
import turnsheet.core.diagnose.parts.Turning;

/**
 * A kind of machine with all that belongs to it. Whatever is returned obeys the rules: labels and
 * names are single, parts refer to parts that exist and not in a circle, limits bound each figure
 * once. A list that breaks one is met with a {@link RefusedChangeException}.
 *
 * @param name no other model has it
 * @param pulsesPerTurn of the sensor wheel; null where there is none or nobody has counted
 * @param note may be empty
 * @param settings in the order of the selector
 */
public record MachineModel(
    ModelId id,
    String name,
    @Nullable Integer pulsesPerTurn,
    String note,
    List<SpeedSetting> settings,
    List<RotatingPart> parts,
    List<ServiceLimit> limits) {

  public static final int NAME_LENGTH = 200;
  public static final int NOTE_LENGTH = 4000;

  public MachineModel {
    Require.text("name", name, NAME_LENGTH);
    Require.atMost("note", note, NOTE_LENGTH);
    if (pulsesPerTurn != null && pulsesPerTurn < 1) {
      throw new IllegalArgumentException("pulses per turn " + pulsesPerTurn);
    }
    settings = List.copyOf(settings);
    parts = List.copyOf(parts);
    limits = List.copyOf(limits);
    ModelRules.check(settings, parts, limits);
  }

  /** A model of which no more than this is known yet. */
  public static MachineModel named(String name, @Nullable Integer pulsesPerTurn, String note) {
    return new MachineModel(
        ModelId.next(), name, pulsesPerTurn, note, List.of(), List.of(), List.of());
  }

  public Optional<SpeedSetting> setting(SpeedSettingId settingId) {
    return settings.stream().filter(s -> s.id().equals(settingId)).findFirst();
  }

  public Optional<RotatingPart> part(String partName) {
    return parts.stream().filter(p -> p.name().equals(partName)).findFirst();
  }

  /** The limits that hold at a speed setting. */
  public List<ServiceLimit> limitsAt(SpeedSettingId settingId) {
    return limits.stream().filter(l -> l.settingId().equals(settingId)).toList();
  }

  /**
   * Pulses per second of the tachometer at nominal speed: as given with the setting, else pulses
   * per turn times the nominal rotation; empty where neither is known.
   */
  public OptionalDouble pulsesPerSecond(SpeedSetting setting) {
    Double given = setting.pulsesPerSecond();
    if (given != null) {
      return OptionalDouble.of(given);
    }
    OptionalDouble turns = setting.turnsPerSecond();
    return pulsesPerTurn != null && turns.isPresent()
        ? OptionalDouble.of(pulsesPerTurn * turns.getAsDouble())
        : OptionalDouble.empty();
  }

  /**
   * How often a part turns at a speed setting that is kept exactly; empty where it follows from
   * something that the setting does not have, such as a roller's from a turning rate.
   */
  public Optional<Turning> turningAt(RotatingPart part, SpeedSetting setting, double mainsHertz) {
    return new Kinematics(PartMotion.parts(this), PartMotion.nominal(setting, mainsHertz))
        .of(PartMotion.part(part));
  }

  public MachineModel describe(String newName, @Nullable Integer pulses, String newNote) {
    return new MachineModel(id, newName, pulses, newNote, settings, parts, limits);
  }

  /** Puts a setting in the place of the one with its id, or at the end. */
  public MachineModel withSetting(SpeedSetting changed) {
    boolean known = setting(changed.id()).isPresent();
    List<SpeedSetting> now =
        known
            ? settings.stream().map(s -> s.id().equals(changed.id()) ? changed : s).toList()
            : Stream.concat(settings.stream(), Stream.of(changed)).toList();
    return new MachineModel(id, name, pulsesPerTurn, note, now, parts, limits);
  }

  /** Takes a setting away, and its limits with it. */
  public MachineModel withoutSetting(SpeedSettingId gone) {
    return new MachineModel(
        id,
        name,
        pulsesPerTurn,
        note,
        settings.stream().filter(s -> !s.id().equals(gone)).toList(),
        parts,
        limits.stream().filter(l -> !l.settingId().equals(gone)).toList());
  }

  public MachineModel withPart(RotatingPart added) {
    return withParts(Stream.concat(parts.stream(), Stream.of(added)).toList());
  }

  /** Puts a part in the place of the named one; parts that refer to it follow its new name. */
  public MachineModel changePart(String oldName, RotatingPart changed) {
    return withParts(
        parts.stream()
            .map(p -> p.name().equals(oldName) ? changed : follow(p, oldName, changed.name()))
            .toList());
  }

  /**
   * Takes a part away.
   *
   * @throws RefusedChangeException {@code partReferred} where another part's rate follows from it
   */
  public MachineModel withoutPart(String gone) {
    parts.stream()
        .filter(p -> gone.equals(p.referencePart()))
        .findFirst()
        .ifPresent(
            p -> {
              throw new RefusedChangeException("partReferred", gone, p.name());
            });
    return withParts(parts.stream().filter(p -> !p.name().equals(gone)).toList());
  }

  public MachineModel withLimit(ServiceLimit added) {
    return withLimits(Stream.concat(limits.stream(), Stream.of(added)).toList());
  }

  /** Puts a limit in the place of another. */
  public MachineModel changeLimit(ServiceLimit old, ServiceLimit changed) {
    return withLimits(limits.stream().map(l -> l.equals(old) ? changed : l).toList());
  }

  public MachineModel withoutLimit(ServiceLimit gone) {
    return withLimits(limits.stream().filter(l -> !l.equals(gone)).toList());
  }

  private MachineModel withParts(List<RotatingPart> now) {
    return new MachineModel(id, name, pulsesPerTurn, note, settings, now, limits);
  }

  private MachineModel withLimits(List<ServiceLimit> now) {
    return new MachineModel(id, name, pulsesPerTurn, note, settings, parts, now);
  }

  private static RotatingPart follow(RotatingPart part, String oldName, String newName) {
    return oldName.equals(part.referencePart()) ? part.following(newName) : part;
  }
}
