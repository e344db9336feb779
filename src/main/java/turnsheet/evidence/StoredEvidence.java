package turnsheet.evidence;

import java.time.Instant;

/** The evidence of one channel as it is kept. */
public record StoredEvidence(Instant madeAt, EvidenceDocument document) {}
