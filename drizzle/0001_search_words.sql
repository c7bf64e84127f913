-- Full-text search over search_entries: by word, and by runs of three letters for words that recognition has bent.
CREATE VIRTUAL TABLE search_words USING fts5(body, content='search_entries', content_rowid='id', tokenize='unicode61 remove_diacritics 2');
--> statement-breakpoint
CREATE VIRTUAL TABLE search_trigrams USING fts5(body, content='search_entries', content_rowid='id', tokenize='trigram remove_diacritics 1');
--> statement-breakpoint
CREATE TRIGGER search_entries_added AFTER INSERT ON search_entries BEGIN
  INSERT INTO search_words(rowid, body) VALUES (new.id, new.body);
  INSERT INTO search_trigrams(rowid, body) VALUES (new.id, new.body);
END;
--> statement-breakpoint
CREATE TRIGGER search_entries_removed AFTER DELETE ON search_entries BEGIN
  INSERT INTO search_words(search_words, rowid, body) VALUES ('delete', old.id, old.body);
  INSERT INTO search_trigrams(search_trigrams, rowid, body) VALUES ('delete', old.id, old.body);
END;
