package turnsheet.shop;

import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.springframework.dao.DataIntegrityViolationException;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;

/** The machine models that the shop looks after. */
@Component
public final class MachineModels {

  private static final PageQuery.Listing LISTING =
      new PageQuery.Listing(
          """
          select m.id, m.name, m.pulses_per_turn,
            (select count(*) from speed_setting s where s.model_id = m.id) as settings,
            (select count(*) from rotating_part p where p.model_id = m.id) as parts,
            (select count(*) from service_limit l where l.model_id = m.id) as limits,
            (select count(*) from unit u where u.model_id = m.id) as units
          """,
          "from machine_model m",
          "",
          List.of(),
          "m.name || ' ' || m.note",
          "order by lower(m.name), m.id");

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;

  public MachineModels(JdbcClient jdbc, TransactionOperations transactions) {
    this.jdbc = jdbc;
    this.transactions = transactions;
  }

  public Optional<MachineModel> find(ModelId id) {
    return new ModelRows(jdbc).read(List.of(id)).stream().findFirst();
  }

  /** The model that a speed setting belongs to. */
  public Optional<MachineModel> ofSetting(SpeedSettingId id) {
    return jdbc.sql("select model_id from speed_setting where id = ?")
        .param(id.value())
        .query((row, n) -> new ModelId(Columns.uuid(row, "model_id")))
        .optional()
        .flatMap(this::find);
  }

  /** A page in the order of names; words are looked for in name and note. */
  public PageOf<ModelSummary> page(PageQuery query) {
    return query.run(
        jdbc,
        LISTING,
        (row, n) ->
            new ModelSummary(
                new ModelId(Columns.uuid(row, "id")),
                row.getString("name"),
                Columns.intOrNull(row, "pulses_per_turn"),
                row.getInt("settings"),
                row.getInt("parts"),
                row.getInt("limits"),
                row.getInt("units")));
  }

  /** A page of whole models: five statements however many they are. */
  public PageOf<MachineModel> wholePage(PageQuery query) {
    PageOf<ModelSummary> page = page(query);
    List<MachineModel> whole =
        new ModelRows(jdbc).read(page.items().stream().map(ModelSummary::id).toList());
    return new PageOf<>(whole, page.number(), page.size(), page.total());
  }

  /**
   * Enters a model.
   *
   * @throws RefusedChangeException {@code modelNameTaken}
   */
  public MachineModel add(MachineModel added) {
    return guarded(
        added,
        () -> {
          new ModelRows(jdbc).insert(added);
          return added;
        });
  }

  /**
   * Changes a model by one of its verbs; changes that come together queue, so that none is lost.
   *
   * @throws RefusedChangeException from the verb, or {@code modelNameTaken}, or {@code
   *     settingHasCaptures} where a setting would go that captures were made at
   */
  public Optional<MachineModel> change(ModelId id, UnaryOperator<MachineModel> verb) {
    ModelRows rows = new ModelRows(jdbc);
    return transactions.execute(
        status -> {
          rows.lock(id);
          return find(id)
              .map(
                  old -> {
                    MachineModel changed = verb.apply(old);
                    return guarded(
                        changed,
                        () -> {
                          rows.update(old, changed);
                          return changed;
                        });
                  });
        });
  }

  private MachineModel guarded(
      MachineModel model, java.util.function.Supplier<MachineModel> writing) {
    try {
      return transactions.execute(status -> writing.get());
    } catch (DuplicateKeyException e) {
      throw new RefusedChangeException("modelNameTaken", model.name());
    } catch (DataIntegrityViolationException e) {
      throw new RefusedChangeException("settingHasCaptures");
    }
  }
}
