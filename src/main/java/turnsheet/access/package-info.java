/** Accounts, roles, sign-in, one-time addresses, API keys, audit trail. */
@NullMarked
package turnsheet.access;

import org.jspecify.annotations.NullMarked;
