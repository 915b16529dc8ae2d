import { benchHttp } from "./http.ts";
import { benchRigid } from "./rigid.ts";
import { benchScreen } from "./screen.ts";
import { benchStart } from "./start.ts";

benchScreen();
benchRigid();
await benchHttp();
await benchStart();
