/**
 * Who may do what, written by hand and read by people first. Columns: V a visitor; P somebody signed in who has nothing to
 * do with the row; S the person whom the row is about; B, K, O the bench, the packer and the owner of the row's workshop;
 * H the host. A capital means yes, a dot no; 2 at the end asks for a fresh second factor.
 */
export const DEED_TABLE = `
site:read               VPSBKOH
workshop:visit          VPSBKOH
module:visit            VPSBKOH
form:resume             VPSBKOH
session:start           VPSBKOH
session:end             .PSBKOH
session:list            ..S....
mail:unsubscribe        VPSBKOH
mail:prefer             ..S....
invitation:decline      VPSBKOH
membership:accept       .PSBKOH
workshop:start          .PSBKOH
second_factor:set_up    .PSBKOH
second_factor:give      .PSBKOH
sandbox:use             VPSBKOH

account:read            .PSBKOH
account:write           ..S....
account:export          ..S....
account:erase           ..S....

workshop:read           .....O.
workshop:write          .....O.
workshop:export         .....O.
settings:read           .....O.
settings:write          .....O.
terms:write             .....O.
tax:write               .....O.
destination:write       .....O.
member:list             .....O.
member:invite           .....O.
member:remove           .....O.
payment_account:read    .....O.
payment_account:connect .....O. 2
digest:read             .....O.
audit:read              .....O.
host:read               ......H
workshop:list           ......H
workshop:open           ......H
workshop:suspend        ......H
workshop:reopen         ......H
complaint:read          ......H
totals:read             ......H

module:list             ...B.O.
module:read             ...B.O.
module:create           .....O.
module:write            .....O.
module:preview          ...B.O.
module:publish          .....O.
module:archive          .....O.
revision:read           ...B.O.
revision:create         .....O.
revision:write          .....O.
revision:test           ...B.O.
revision:prove          ...B.O.
revision:supersede      .....O.
lesson:read             ...B.O.
lesson:write            ...B.O.
lesson:mend             ...B.O.
lesson:waive            .....O.
part:read               .....O.
part:write              .....O.
part:import             .....O.
part:check_sample       ...B.O.
quote:write             .....O.
quote:import            .....O.
offer:read              ...B.O.
offer:write             .....O.
choice:write            .....O.
file:read               ...B.O.
file:add                ...B.O.
file:remove             .....O.

run:list                .....O.
run:read                .....O.
run:create              .....O.
run:write               .....O.
run:open_deposits       .....O.
run:lock                .....O. 2
run:close               .....O.
run:call_off            .....O. 2
run:lower_minimum       .....O.
run:move_decide_by      .....O.
run:change_maximum      .....O.
run:ask_balances        .....O. 2
run:export              .....O.
readiness:waive         .....O.
demand:read             .....O.
demand:export           .....O.
cost:read               .....O.
cost:write              .....O.
plan:read               .....O.
plan:write              .....O.
schedule:read           .....O.
schedule:write          .....O.
outcome:write           .....O.
invitation:list         .....O.
invitation:send         .....O.
update:write            .....O.
update:send             .....O.
notice:read             ..S..O.
notice:send             .....O.
notice:answer           ..S....
mail:list               .....O.
mail:read               .....O.
bulk:read               .....O.
bulk:resume             .....O.
buying:read             .....O.
purchase:write          .....O.
purchase:receive        ...B.O.
stock:read              ...B.O.
stock:write             .....O.
lot:inspect             ...B.O.
lot:waive               .....O.

signup:submit           VPSBKOH
signup:confirm          VPSBKOH
signup:take_back        VPSBKOH
signup:read             ..S....
signup:change           ..S....
signup:list             .....O.

order:place             .PSBKOH
order:list_own          .PSBKOH
order:read              ..S..O.
order:pay               ..S....
order:cancel            ..S....
order:withdraw          ..S....
order:leave_waiting     ..S....
order:change            ..S....
order:choose            ..S....
order:set_address       ..S..O.
order:list              .....O.
order:enter             .....O.
order:export            .....O.
order:cancel_for_buyer  .....O. 2
order:reinstate         .....O.
order:offer_place       .....O.
order:hold              ....KO.
order:receive_return    ....KO.
invoice:read            ..S..O.
invoice:write           .....O.
document:read           ..S..O.
test_sheet:read         ..SB.O.

money:read              .....O.
balance:charge          .....O. 2
balance:remind          .....O.
refund:read             .....O.
refund:send             .....O. 2
refund:retry            .....O. 2
attempt:look_up         .....O.
dispute:read            .....O.
dispute:answer          .....O.
payout:send             .....O. 2
ledger:read             .....O.
ledger:export           .....O.
ledger:reconcile        .....O.
tax:report              .....O.

bench:read              ...B.O.
test_plan:read          ...B.O.
test_plan:write         ...B.O.
unit:read               ...B.O.
unit:start              ...B.O.
unit:record             ...B.O.
unit:rework             ...B.O.
unit:scrap              ...B.O.
unit:import             ...B.O.
result:read             ...B.O.
result:export           ...B.O.

packing:read            ....KO.
batch:take              ....KO.
batch:assign            ....KO.
paper:print             ....KO.
parcel:read             ....KO.
parcel:open             ....KO.
parcel:hold             ....KO.
parcel:split            ....KO.
parcel:pack             ....KO.
parcel:reopen           ....KO.
parcel:discard          ....KO.
parcel:hand_over        ....KO.
parcel:track            ....KO.
parcel:report           ....KO.
tracking:import         ....KO.
customs:read            ....KO.
customs:write           ....KO.
post:export             ....KO.
postage:write           .....O.
unit:allocate           ....KO.

problem:open            ..S..O.
problem:read            ..S..O.
problem:reply           ..S..O.
problem:reopen          ..S..O.
problem:list            .....O.
problem:answer          .....O.
problem:close           ..S..O.
`
