package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import turnsheet.shop.MachineModel;

/** The head of a machine model as typed. */
record ModelForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = MachineModel.NAME_LENGTH, message = "{shop.form.tooLong}")
        String name,
    String pulsesPerTurn,
    @Size(max = MachineModel.NOTE_LENGTH, message = "{shop.form.tooLong}") String note) {

  static final ModelForm EMPTY = new ModelForm("", "", "");

  ModelForm {
    name = Typed.text(name);
    pulsesPerTurn = Typed.text(pulsesPerTurn);
    note = Typed.text(note);
  }

  static ModelForm of(MachineModel model) {
    return new ModelForm(model.name(), Typed.number(model.pulsesPerTurn()), model.note());
  }
}
