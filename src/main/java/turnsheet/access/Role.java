package turnsheet.access;

/** What an account may do. */
public enum Role {
  /** Everything, people and the keys of others included. */
  OWNER,
  /** Bench work: everything but people and the keys of others. */
  TECHNICIAN;

  /** The name of the right in the security context. */
  String authority() {
    return "ROLE_" + name();
  }
}
