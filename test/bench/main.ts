import { benchHttp } from "./http.ts";
import { benchScreen } from "./screen.ts";
import { benchStart } from "./start.ts";

benchScreen();
await benchHttp();
await benchStart();
