CREATE TABLE "workers" (
	"id" text PRIMARY KEY NOT NULL,
	"seen_at" timestamp with time zone NOT NULL
);
