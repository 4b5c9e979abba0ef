CREATE TABLE "sign_in_attempts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"address_digest" text NOT NULL,
	"origin_digest" text NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "sign_in_attempts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE INDEX "sign_in_attempts_by_address" ON "sign_in_attempts" USING btree ("address_digest","at");--> statement-breakpoint
CREATE INDEX "sign_in_attempts_by_time" ON "sign_in_attempts" USING btree ("at");