import type { QueryInterface } from 'sequelize';

/**
 * What is written once cannot be deleted either, but by what it belongs to (a build, with its log); and every foreign key
 * has an index that serves it whole.
 */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    create function refuse_delete() returns trigger language plpgsql as $$
    begin
      -- A cascade runs inside the trigger of its foreign key, so one level deeper than a statement of anybody's.
      if tg_level = 'ROW' and pg_trigger_depth() > 1 then
        return old;
      end if;
      raise exception '% is written once and never deleted', tg_table_name using errcode = 'integrity_constraint_violation';
    end $$;
    create trigger plan_revisions_never_deleted before delete on plan_revisions for each row execute function refuse_delete();
    create trigger plan_revisions_never_emptied before truncate on plan_revisions execute function refuse_delete();
    create trigger log_entries_never_deleted before delete on log_entries for each row execute function refuse_delete();
    create trigger log_entries_never_emptied before truncate on log_entries execute function refuse_delete();

    create index plans_by_current_revision on plans (current_revision_id);
    drop index crew_members_by_account;
    create index crew_members_by_account on crew_members (account_id);
  `);
}
