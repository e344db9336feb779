package turnsheet.shop.web;

import java.util.Optional;
import java.util.UUID;
import java.util.function.UnaryOperator;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import org.springframework.validation.BindingResult;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.RefusedChangeException;
import turnsheet.web.NotFoundException;

/** Carries out one verb on a machine model for a page. */
@Component
class ModelChange {

  private final MachineModels models;
  private final Refusals refusals;

  ModelChange(MachineModels models, Refusals refusals) {
    this.models = models;
    this.refusals = refusals;
  }

  /**
   * Whether it was done; else the errors say why not.
   *
   * @param field beside which the sentence stands; null for the form as a whole
   */
  boolean done(
      UUID id, UnaryOperator<MachineModel> verb, BindingResult errors, @Nullable String field) {
    try {
      found(models.change(new ModelId(id), verb));
      return true;
    } catch (RefusedChangeException e) {
      refusals.show(e, errors, field);
      return false;
    }
  }

  /**
   * For a page without fields.
   *
   * @throws turnsheet.web.RefusedRequestException with the sentence
   */
  void orAnswer(UUID id, UnaryOperator<MachineModel> verb) {
    found(refusals.orAnswer(() -> models.change(new ModelId(id), verb)));
  }

  private static void found(Optional<MachineModel> changed) {
    if (changed.isEmpty()) {
      throw new NotFoundException("machine model");
    }
  }
}
