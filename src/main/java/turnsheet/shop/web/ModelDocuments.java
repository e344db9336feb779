package turnsheet.shop.web;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import org.springframework.stereotype.Component;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ModelId;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;

/** Between machine models and their JSON. */
@Component
class ModelDocuments {

  private final Refusals refusals;
  private final PartDocuments parts;

  ModelDocuments(Refusals refusals, PartDocuments parts) {
    this.refusals = refusals;
    this.parts = parts;
  }

  /** What was sent, in the place of a model or as a new one; settings keep their ids by label. */
  MachineModel read(ModelDocument sent, MachineModel old) {
    Map<String, SpeedSettingId> byLabel = new HashMap<>();
    old.settings().forEach(s -> byLabel.put(s.label(), s.id()));
    List<SpeedSetting> settings = new ArrayList<>();
    for (ModelDocument.Setting setting : sent.speedSettings()) {
      settings.add(setting(setting, settingId(setting, old, byLabel)));
    }
    return new MachineModel(
        old.id(),
        sent.name(),
        sent.pulsesPerTurn(),
        sent.note(),
        settings,
        sent.rotatingParts().stream().map(parts::read).toList(),
        sent.serviceLimits().stream().map(l -> limit(l, settings)).toList());
  }

  /** A new model has nothing to keep. */
  MachineModel read(ModelDocument sent) {
    return read(
        sent,
        new MachineModel(ModelId.next(), sent.name(), null, "", List.of(), List.of(), List.of()));
  }

  ModelDocument write(MachineModel model) {
    return new ModelDocument(
        model.id().value(),
        model.name(),
        model.pulsesPerTurn(),
        model.note(),
        model.settings().stream().map(ModelDocuments::setting).toList(),
        model.parts().stream().map(p -> parts.write(model, p)).toList(),
        model.limits().stream().map(l -> limit(model, l)).toList());
  }

  private static SpeedSettingId settingId(
      ModelDocument.Setting sent, MachineModel old, Map<String, SpeedSettingId> byLabel) {
    UUID id = sent.id();
    if (id != null && old.setting(new SpeedSettingId(id)).isPresent()) {
      return new SpeedSettingId(id);
    }
    SpeedSettingId known = id == null ? byLabel.get(sent.label()) : null;
    return known == null ? SpeedSettingId.next() : known;
  }

  private SpeedSetting setting(ModelDocument.Setting sent, SpeedSettingId id) {
    Double tape = sent.speedCmPerS();
    Double turns = sent.speedRevPerMin();
    if (tape != null && turns == null) {
      return new SpeedSetting(
          id, sent.label(), SpeedUnit.CM_PER_S, tape, sent.toneHz(), sent.pulsesPerSecond());
    }
    if (tape == null && turns != null) {
      return new SpeedSetting(
          id, sent.label(), SpeedUnit.REV_PER_MIN, turns, sent.toneHz(), sent.pulsesPerSecond());
    }
    throw refusals.answer("speedOnce", sent.label());
  }

  private ServiceLimit limit(ModelDocument.Limit sent, List<SpeedSetting> settings) {
    FigureName figure =
        FigureName.ofPath(sent.figure())
            .orElseThrow(() -> refusals.answer("figureUnknown", sent.figure()));
    SpeedSettingId setting =
        settings.stream()
            .filter(s -> s.label().equals(sent.speedSetting()))
            .findFirst()
            .orElseThrow(() -> refusals.answer("limitSettingLabel", sent.speedSetting()))
            .id();
    return new ServiceLimit(setting, figure, sent.upperBound(), sent.origin());
  }

  private static ModelDocument.Setting setting(SpeedSetting setting) {
    boolean tape = setting.unit() == SpeedUnit.CM_PER_S;
    return new ModelDocument.Setting(
        setting.id().value(),
        setting.label(),
        tape ? setting.nominalSpeed() : null,
        tape ? null : setting.nominalSpeed(),
        setting.toneHz(),
        setting.pulsesPerSecond());
  }

  private static ModelDocument.Limit limit(MachineModel model, ServiceLimit limit) {
    return new ModelDocument.Limit(
        model.setting(limit.settingId()).orElseThrow().label(),
        limit.figure().path(),
        limit.upperBound(),
        limit.origin());
  }
}
