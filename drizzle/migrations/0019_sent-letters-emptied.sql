UPDATE "mails" SET "text" = '', "html" = '' WHERE "sent_at" IS NOT NULL;
