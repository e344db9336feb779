package turnsheet.core.diagnose;

/** How a shop turns a figure, its uncertainty and a limit into a verdict (ILAC-G8:09/2019). */
public enum DecisionRule {
  /**
   * Binary, simple acceptance (clause 4.2.1): within where the value keeps the limit; up to half of
   * the decisions are wrong for a unit that lies at the limit itself.
   */
  SIMPLE,
  /**
   * Non-binary with guard band w = U (clause 4.2.3): undecided where the interval holds the limit;
   * at most 2.3 % of the units beyond the limit are called within.
   */
  GUARDED
}
