/**
 * Keeps every act at the desk in a hash chain; it can be read, never changed.
 *
 * <p><b>Door.</b> {@link org.shearbook.desk.audit.AuditTrail} gives the moment at which an act is recorded and
 * reads the chain; {@link org.shearbook.desk.audit.AccessTrail} keeps sign-ins and reads.
 * <b>Heard.</b> Every event that is {@link org.shearbook.desk.audit.Audited}, in the transaction of the act.
 * <b>Tables.</b> {@code audit_entry}, {@code audit_chain}, {@code access_entry}.
 */
@ApplicationModule(displayName = "Audit", allowedDependencies = {"shell"})
@NullMarked
package org.shearbook.desk.audit;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
