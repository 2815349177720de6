import type { MigrationInterface, QueryRunner } from 'typeorm';

export class Start1796147170942 implements MigrationInterface {
  name = 'Start1796147170942';

  public async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(
      `CREATE TABLE \`productions\` (\`id\` uuid NOT NULL, \`slug\` varchar(60) NOT NULL, \`name\` varchar(120) NOT NULL, \`tolerances\` json NULL, \`eventSeq\` int NOT NULL DEFAULT '0', \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), UNIQUE INDEX \`IDX_0acb6712018fe3a57ca7420bb9\` (\`slug\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`shots\` (\`id\` uuid NOT NULL, \`productionId\` uuid NOT NULL, \`number\` varchar(40) NOT NULL, \`title\` varchar(120) NOT NULL, \`lastTakeNumber\` int NOT NULL DEFAULT '0', \`revision\` int NOT NULL DEFAULT '0', \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), UNIQUE INDEX \`IDX_6418d16ac5855de26a76bc3c81\` (\`productionId\`, \`number\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`users\` (\`id\` uuid NOT NULL, \`email\` varchar(254) NOT NULL, \`name\` varchar(120) NOT NULL, \`initials\` varchar(3) NOT NULL, \`passwordHash\` varchar(255) NOT NULL, \`createdAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), UNIQUE INDEX \`IDX_97672ac88f789774dd47f7c8be\` (\`email\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`takes\` (\`id\` uuid NOT NULL, \`productionId\` uuid NOT NULL, \`shotId\` uuid NOT NULL, \`number\` int NOT NULL, \`postedById\` uuid NOT NULL, \`postedAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`postedSeq\` int NOT NULL, \`revision\` int NOT NULL, \`stampsRevision\` int NOT NULL DEFAULT '0', \`review\` varchar(20) NOT NULL DEFAULT 'waiting', \`readingStatus\` varchar(20) NOT NULL DEFAULT 'queued', \`readingMessage\` varchar(500) NULL, \`kind\` varchar(10) NOT NULL, \`fpsNum\` int NOT NULL, \`fpsDen\` int NOT NULL, \`hold\` json NULL, \`firstFrame\` int NOT NULL, \`frames\` int NOT NULL, \`width\` int NOT NULL, \`height\` int NOT NULL, \`changed\` text NOT NULL, \`intended\` text NOT NULL, \`missingFrames\` json NOT NULL, INDEX \`IDX_dc5ebd3e8819fbd40c991628e4\` (\`readingStatus\`), UNIQUE INDEX \`IDX_22a7f9897c13ca625e7d11fa27\` (\`productionId\`, \`postedSeq\`), UNIQUE INDEX \`IDX_90b17ba0d62a525498999d6810\` (\`shotId\`, \`number\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`decisions\` (\`id\` uuid NOT NULL, \`takeId\` uuid NOT NULL, \`byId\` uuid NOT NULL, \`state\` varchar(20) NOT NULL, \`remark\` text NOT NULL, \`seq\` int NOT NULL, \`decidedAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_a06436a445dc66c67467339ecc\` (\`takeId\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`drafts\` (\`id\` uuid NOT NULL, \`productionId\` uuid NOT NULL, \`userId\` uuid NOT NULL, \`status\` varchar(10) NOT NULL DEFAULT 'open', \`grid\` json NULL, \`refused\` json NOT NULL, \`touchedAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_637502bed7f10ed7d7c7f25b5d\` (\`touchedAt\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`draft_pictures\` (\`draftId\` uuid NOT NULL, \`name\` varchar(255) CHARACTER SET "utf8mb4" COLLATE "utf8mb4_bin" NOT NULL, \`file\` varchar(40) NOT NULL, \`format\` varchar(10) NOT NULL, \`width\` int NOT NULL, \`height\` int NOT NULL, PRIMARY KEY (\`draftId\`, \`name\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`memberships\` (\`productionId\` uuid NOT NULL, \`userId\` uuid NOT NULL, \`role\` varchar(20) NOT NULL, \`joinedAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), INDEX \`IDX_187d573e43b2c2aa3960df20b7\` (\`userId\`), PRIMARY KEY (\`productionId\`, \`userId\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`threads\` (\`id\` uuid NOT NULL, \`takeId\` uuid NOT NULL, \`frame\` int NOT NULL, INDEX \`IDX_c6945fa8d150d30ec243b9760a\` (\`takeId\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`notes\` (\`id\` uuid NOT NULL, \`threadId\` uuid NOT NULL, \`authorId\` uuid NOT NULL, \`body\` text NOT NULL, \`writtenAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`seq\` int NOT NULL, \`stampsRevision\` int NOT NULL DEFAULT '0', INDEX \`IDX_f34f71508a164f280d859d52d1\` (\`threadId\`), PRIMARY KEY (\`id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`note_stamps\` (\`noteId\` uuid NOT NULL, \`userId\` uuid NOT NULL, \`kind\` varchar(20) NOT NULL, \`seq\` int NOT NULL, PRIMARY KEY (\`noteId\`, \`userId\`, \`kind\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`production_events\` (\`productionId\` uuid NOT NULL, \`seq\` int NOT NULL, \`kind\` varchar(40) NOT NULL, \`actorId\` uuid NULL, \`at\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), \`payload\` longtext NOT NULL, PRIMARY KEY (\`productionId\`, \`seq\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`readings\` (\`takeId\` uuid NOT NULL, \`engine\` varchar(40) NOT NULL, \`document\` longtext NOT NULL, \`sketch\` json NOT NULL, \`findingCount\` int NOT NULL, \`readAt\` datetime(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), PRIMARY KEY (\`takeId\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`sessions\` (\`session_id\` varchar(128) CHARACTER SET "utf8mb4" COLLATE "utf8mb4_bin" NOT NULL, \`expires\` int UNSIGNED NOT NULL, \`data\` mediumtext CHARACTER SET "utf8mb4" COLLATE "utf8mb4_bin" NULL, PRIMARY KEY (\`session_id\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`take_frames\` (\`takeId\` uuid NOT NULL, \`frame\` int NOT NULL, \`file\` varchar(40) NOT NULL, \`mediaType\` varchar(20) NOT NULL, \`originalName\` varchar(255) NOT NULL, PRIMARY KEY (\`takeId\`, \`frame\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `CREATE TABLE \`take_stamps\` (\`takeId\` uuid NOT NULL, \`userId\` uuid NOT NULL, \`kind\` varchar(20) NOT NULL, \`seq\` int NOT NULL, PRIMARY KEY (\`takeId\`, \`userId\`, \`kind\`)) ENGINE=InnoDB`,
    );
    await queryRunner.query(
      `ALTER TABLE \`shots\` ADD CONSTRAINT \`FK_4e49863728f605313395ff84071\` FOREIGN KEY (\`productionId\`) REFERENCES \`productions\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`takes\` ADD CONSTRAINT \`FK_1f27e033e68132e134319919daf\` FOREIGN KEY (\`productionId\`) REFERENCES \`productions\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`takes\` ADD CONSTRAINT \`FK_ff4b3c47af7c51f38ade89eb641\` FOREIGN KEY (\`shotId\`) REFERENCES \`shots\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`takes\` ADD CONSTRAINT \`FK_b9a11d5807c0af86c84a46aa90f\` FOREIGN KEY (\`postedById\`) REFERENCES \`users\`(\`id\`) ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`decisions\` ADD CONSTRAINT \`FK_a06436a445dc66c67467339ecc2\` FOREIGN KEY (\`takeId\`) REFERENCES \`takes\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`decisions\` ADD CONSTRAINT \`FK_1fa3f83ca57d89ddd38defda557\` FOREIGN KEY (\`byId\`) REFERENCES \`users\`(\`id\`) ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`drafts\` ADD CONSTRAINT \`FK_5f5b12cbb826413146d35584c3c\` FOREIGN KEY (\`productionId\`) REFERENCES \`productions\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`drafts\` ADD CONSTRAINT \`FK_6b4e9f2a1131fc1e9c5ba6ceaeb\` FOREIGN KEY (\`userId\`) REFERENCES \`users\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`draft_pictures\` ADD CONSTRAINT \`FK_60b51a1edb0c235671a360cdaaf\` FOREIGN KEY (\`draftId\`) REFERENCES \`drafts\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`memberships\` ADD CONSTRAINT \`FK_ca2490541fb4be792c67c897eb0\` FOREIGN KEY (\`productionId\`) REFERENCES \`productions\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`memberships\` ADD CONSTRAINT \`FK_187d573e43b2c2aa3960df20b78\` FOREIGN KEY (\`userId\`) REFERENCES \`users\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`threads\` ADD CONSTRAINT \`FK_c6945fa8d150d30ec243b9760a6\` FOREIGN KEY (\`takeId\`) REFERENCES \`takes\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`notes\` ADD CONSTRAINT \`FK_f34f71508a164f280d859d52d11\` FOREIGN KEY (\`threadId\`) REFERENCES \`threads\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`notes\` ADD CONSTRAINT \`FK_d358080cb403fe88e62cc9cba58\` FOREIGN KEY (\`authorId\`) REFERENCES \`users\`(\`id\`) ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`note_stamps\` ADD CONSTRAINT \`FK_e262d846ea7a10f69d0782aec93\` FOREIGN KEY (\`noteId\`) REFERENCES \`notes\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`note_stamps\` ADD CONSTRAINT \`FK_ee68a825631d0c2eb201e382cc6\` FOREIGN KEY (\`userId\`) REFERENCES \`users\`(\`id\`) ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`production_events\` ADD CONSTRAINT \`FK_96fde2b8db931c8d2251709a7e4\` FOREIGN KEY (\`productionId\`) REFERENCES \`productions\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`production_events\` ADD CONSTRAINT \`FK_588b6d052921b95d6d025c7382f\` FOREIGN KEY (\`actorId\`) REFERENCES \`users\`(\`id\`) ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`readings\` ADD CONSTRAINT \`FK_5213fe2e74eb8bd628ab178797a\` FOREIGN KEY (\`takeId\`) REFERENCES \`takes\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`take_frames\` ADD CONSTRAINT \`FK_8f09569b1c0589dc7630276f4b0\` FOREIGN KEY (\`takeId\`) REFERENCES \`takes\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`take_stamps\` ADD CONSTRAINT \`FK_b5116af863109f0137bfcffbb5f\` FOREIGN KEY (\`takeId\`) REFERENCES \`takes\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION`,
    );
    await queryRunner.query(
      `ALTER TABLE \`take_stamps\` ADD CONSTRAINT \`FK_10b7776d94463fb7e7b06ffd672\` FOREIGN KEY (\`userId\`) REFERENCES \`users\`(\`id\`) ON DELETE NO ACTION ON UPDATE NO ACTION`,
    );
  }

  public async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`ALTER TABLE \`take_stamps\` DROP FOREIGN KEY \`FK_10b7776d94463fb7e7b06ffd672\``);
    await queryRunner.query(`ALTER TABLE \`take_stamps\` DROP FOREIGN KEY \`FK_b5116af863109f0137bfcffbb5f\``);
    await queryRunner.query(`ALTER TABLE \`take_frames\` DROP FOREIGN KEY \`FK_8f09569b1c0589dc7630276f4b0\``);
    await queryRunner.query(`ALTER TABLE \`readings\` DROP FOREIGN KEY \`FK_5213fe2e74eb8bd628ab178797a\``);
    await queryRunner.query(`ALTER TABLE \`production_events\` DROP FOREIGN KEY \`FK_588b6d052921b95d6d025c7382f\``);
    await queryRunner.query(`ALTER TABLE \`production_events\` DROP FOREIGN KEY \`FK_96fde2b8db931c8d2251709a7e4\``);
    await queryRunner.query(`ALTER TABLE \`note_stamps\` DROP FOREIGN KEY \`FK_ee68a825631d0c2eb201e382cc6\``);
    await queryRunner.query(`ALTER TABLE \`note_stamps\` DROP FOREIGN KEY \`FK_e262d846ea7a10f69d0782aec93\``);
    await queryRunner.query(`ALTER TABLE \`notes\` DROP FOREIGN KEY \`FK_d358080cb403fe88e62cc9cba58\``);
    await queryRunner.query(`ALTER TABLE \`notes\` DROP FOREIGN KEY \`FK_f34f71508a164f280d859d52d11\``);
    await queryRunner.query(`ALTER TABLE \`threads\` DROP FOREIGN KEY \`FK_c6945fa8d150d30ec243b9760a6\``);
    await queryRunner.query(`ALTER TABLE \`memberships\` DROP FOREIGN KEY \`FK_187d573e43b2c2aa3960df20b78\``);
    await queryRunner.query(`ALTER TABLE \`memberships\` DROP FOREIGN KEY \`FK_ca2490541fb4be792c67c897eb0\``);
    await queryRunner.query(`ALTER TABLE \`draft_pictures\` DROP FOREIGN KEY \`FK_60b51a1edb0c235671a360cdaaf\``);
    await queryRunner.query(`ALTER TABLE \`drafts\` DROP FOREIGN KEY \`FK_6b4e9f2a1131fc1e9c5ba6ceaeb\``);
    await queryRunner.query(`ALTER TABLE \`drafts\` DROP FOREIGN KEY \`FK_5f5b12cbb826413146d35584c3c\``);
    await queryRunner.query(`ALTER TABLE \`decisions\` DROP FOREIGN KEY \`FK_1fa3f83ca57d89ddd38defda557\``);
    await queryRunner.query(`ALTER TABLE \`decisions\` DROP FOREIGN KEY \`FK_a06436a445dc66c67467339ecc2\``);
    await queryRunner.query(`ALTER TABLE \`takes\` DROP FOREIGN KEY \`FK_b9a11d5807c0af86c84a46aa90f\``);
    await queryRunner.query(`ALTER TABLE \`takes\` DROP FOREIGN KEY \`FK_ff4b3c47af7c51f38ade89eb641\``);
    await queryRunner.query(`ALTER TABLE \`takes\` DROP FOREIGN KEY \`FK_1f27e033e68132e134319919daf\``);
    await queryRunner.query(`ALTER TABLE \`shots\` DROP FOREIGN KEY \`FK_4e49863728f605313395ff84071\``);
    await queryRunner.query(`DROP TABLE \`take_stamps\``);
    await queryRunner.query(`DROP TABLE \`take_frames\``);
    await queryRunner.query(`DROP TABLE \`sessions\``);
    await queryRunner.query(`DROP TABLE \`readings\``);
    await queryRunner.query(`DROP TABLE \`production_events\``);
    await queryRunner.query(`DROP TABLE \`note_stamps\``);
    await queryRunner.query(`DROP INDEX \`IDX_f34f71508a164f280d859d52d1\` ON \`notes\``);
    await queryRunner.query(`DROP TABLE \`notes\``);
    await queryRunner.query(`DROP INDEX \`IDX_c6945fa8d150d30ec243b9760a\` ON \`threads\``);
    await queryRunner.query(`DROP TABLE \`threads\``);
    await queryRunner.query(`DROP INDEX \`IDX_187d573e43b2c2aa3960df20b7\` ON \`memberships\``);
    await queryRunner.query(`DROP TABLE \`memberships\``);
    await queryRunner.query(`DROP TABLE \`draft_pictures\``);
    await queryRunner.query(`DROP INDEX \`IDX_637502bed7f10ed7d7c7f25b5d\` ON \`drafts\``);
    await queryRunner.query(`DROP TABLE \`drafts\``);
    await queryRunner.query(`DROP INDEX \`IDX_a06436a445dc66c67467339ecc\` ON \`decisions\``);
    await queryRunner.query(`DROP TABLE \`decisions\``);
    await queryRunner.query(`DROP INDEX \`IDX_90b17ba0d62a525498999d6810\` ON \`takes\``);
    await queryRunner.query(`DROP INDEX \`IDX_22a7f9897c13ca625e7d11fa27\` ON \`takes\``);
    await queryRunner.query(`DROP INDEX \`IDX_dc5ebd3e8819fbd40c991628e4\` ON \`takes\``);
    await queryRunner.query(`DROP TABLE \`takes\``);
    await queryRunner.query(`DROP INDEX \`IDX_97672ac88f789774dd47f7c8be\` ON \`users\``);
    await queryRunner.query(`DROP TABLE \`users\``);
    await queryRunner.query(`DROP INDEX \`IDX_6418d16ac5855de26a76bc3c81\` ON \`shots\``);
    await queryRunner.query(`DROP TABLE \`shots\``);
    await queryRunner.query(`DROP INDEX \`IDX_0acb6712018fe3a57ca7420bb9\` ON \`productions\``);
    await queryRunner.query(`DROP TABLE \`productions\``);
  }
}
