-- Append-only tables: a row is never changed or removed; what ends, ends by a later row.
create trigger `item_scheme_refuses_update` before update on `item_scheme` begin select raise(abort, 'item_scheme is append-only'); end;
--> statement-breakpoint
create trigger `item_scheme_refuses_delete` before delete on `item_scheme` begin select raise(abort, 'item_scheme is append-only'); end;
--> statement-breakpoint
create trigger `scheme_version_refuses_update` before update on `scheme_version` begin select raise(abort, 'scheme_version is append-only'); end;
--> statement-breakpoint
create trigger `scheme_version_refuses_delete` before delete on `scheme_version` begin select raise(abort, 'scheme_version is append-only'); end;
--> statement-breakpoint
create trigger `scheme_version_item_refuses_update` before update on `scheme_version_item` begin select raise(abort, 'scheme_version_item is append-only'); end;
--> statement-breakpoint
create trigger `scheme_version_item_refuses_delete` before delete on `scheme_version_item` begin select raise(abort, 'scheme_version_item is append-only'); end;
--> statement-breakpoint
create trigger `reading_refuses_update` before update on `reading` begin select raise(abort, 'reading is append-only'); end;
--> statement-breakpoint
create trigger `reading_refuses_delete` before delete on `reading` begin select raise(abort, 'reading is append-only'); end;
--> statement-breakpoint
create trigger `reading_end_refuses_update` before update on `reading_end` begin select raise(abort, 'reading_end is append-only'); end;
--> statement-breakpoint
create trigger `reading_end_refuses_delete` before delete on `reading_end` begin select raise(abort, 'reading_end is append-only'); end;
--> statement-breakpoint
create trigger `uncovered_refuses_update` before update on `uncovered` begin select raise(abort, 'uncovered is append-only'); end;
--> statement-breakpoint
create trigger `uncovered_refuses_delete` before delete on `uncovered` begin select raise(abort, 'uncovered is append-only'); end;
--> statement-breakpoint
create trigger `verdict_refuses_update` before update on `verdict` begin select raise(abort, 'verdict is append-only'); end;
--> statement-breakpoint
create trigger `verdict_refuses_delete` before delete on `verdict` begin select raise(abort, 'verdict is append-only'); end;
--> statement-breakpoint
create trigger `score_refuses_update` before update on `score` begin select raise(abort, 'score is append-only'); end;
--> statement-breakpoint
create trigger `score_refuses_delete` before delete on `score` begin select raise(abort, 'score is append-only'); end;
--> statement-breakpoint
create trigger `ruling_refuses_update` before update on `ruling` begin select raise(abort, 'ruling is append-only'); end;
--> statement-breakpoint
create trigger `ruling_refuses_delete` before delete on `ruling` begin select raise(abort, 'ruling is append-only'); end;
--> statement-breakpoint
create trigger `ruling_end_refuses_update` before update on `ruling_end` begin select raise(abort, 'ruling_end is append-only'); end;
--> statement-breakpoint
create trigger `ruling_end_refuses_delete` before delete on `ruling_end` begin select raise(abort, 'ruling_end is append-only'); end;
--> statement-breakpoint
create trigger `audit_entry_refuses_update` before update on `audit_entry` begin select raise(abort, 'audit_entry is append-only'); end;
--> statement-breakpoint
create trigger `audit_entry_refuses_delete` before delete on `audit_entry` begin select raise(abort, 'audit_entry is append-only'); end;
