import type {
	Limits,
	Method,
	SampleName,
	ShelterName,
	StepKind,
	TaskCode
} from '../../src/lib/engine';
import type { Colour } from '../../src/lib/server/boats/hulls';
import type { FaceRow } from '../../src/lib/server/db/schema';

/** The demo yard: invented place, people, boats and jobs. */
export const DEMO_YARD = {
	slug: 'samphire-hard',
	name: 'Samphire Hard',
	latitude: 37.02,
	longitude: -7.86,
	elevation: 3,
	timeZone: 'Europe/Lisbon',
	workHours: [
		{ days: [1, 2, 3, 4, 5, 6], from: '07:30', to: '18:30' },
		{ days: [7], from: '08:30', to: '14:00' }
	],
	// Dunes along the seaward side.
	looseSand: { sectors: [{ from: 290, to: 350 }], grainDiameter: 0.25, clayPercent: 1 },
	liftGust: 12,
	highWindGust: 14.4,
	dayRate: 34,
	currency: 'EUR'
};

/** Accounts of the demo yard; the start command prints them. The passphrases are public. */
export const DEMO_PEOPLE = {
	owner: { email: 'wren@samphire.example', name: 'Wren Hallow', password: 'tide-over-the-sill' },
	painter: { email: 'teo@samphire.example', name: 'Teo Quill', password: 'wet-edge-to-the-bow' },
	manager: {
		email: 'ilse@samphire.example',
		name: 'Ilse Marrow',
		password: 'chocks-under-the-keel'
	}
} as const;

export interface DemoFace {
	name: FaceRow['name'];
	side: FaceRow['side'];
	material: FaceRow['material'];
	colour: Colour;
	finish: FaceRow['finish'];
	area: number;
}
export interface DemoStep {
	name: string;
	kind: StepKind;
	method: Method;
	hours: number;
	/** Indices into the boat's faces. */
	faces: number[];
	sheet?: SampleName;
	/** The rule of work without a sheet. */
	task?: TaskCode;
	limits?: Limits;
	shelter?: ShelterName;
}
export interface DemoBoat {
	name: string;
	stand: string;
	heading: number;
	owned: boolean;
	painted: boolean;
	/** Days before and after today. */
	hauled: number;
	launch: number;
	faces: DemoFace[];
	jobs: { name: string; steps: DemoStep[] }[];
}

export const DEMO_BOATS: DemoBoat[] = [
	{
		name: 'Corncrake',
		stand: '7',
		heading: 20,
		owned: true,
		painted: true,
		hauled: 12,
		launch: 16,
		faces: [
			{
				name: 'bottom',
				side: 'starboard',
				material: 'grp',
				colour: 'dark',
				finish: 'matt',
				area: 11
			},
			{
				name: 'topsides',
				side: 'starboard',
				material: 'grp',
				colour: 'light',
				finish: 'gloss',
				area: 9
			}
		],
		jobs: [
			{
				name: 'Barrier coat',
				steps: [
					{
						name: 'barrier coat 3',
						kind: 'coat',
						method: 'roller',
						hours: 2,
						faces: [0],
						sheet: 'epoxyBarrier'
					},
					{
						name: 'antifouling 1',
						kind: 'coat',
						method: 'roller',
						hours: 1.5,
						faces: [0],
						sheet: 'erodingAntifouling'
					}
				]
			},
			{
				name: 'Topsides',
				steps: [
					{
						name: 'topcoat 2',
						kind: 'coat',
						method: 'rollAndTip',
						hours: 1.75,
						faces: [1],
						sheet: 'polyurethaneTopcoat'
					}
				]
			}
		]
	},
	{
		name: 'Tansy',
		stand: '3',
		heading: 205,
		owned: true,
		painted: false,
		hauled: 5,
		launch: 24,
		faces: [
			{
				name: 'coachroof',
				side: 'both',
				material: 'timber',
				colour: 'mid',
				finish: 'gloss',
				area: 4
			},
			{ name: 'bottom', side: 'port', material: 'timber', colour: 'mid', finish: 'matt', area: 8 }
		],
		jobs: [
			{
				name: 'Brightwork',
				steps: [
					{
						name: 'varnish 4',
						kind: 'coat',
						method: 'brush',
						hours: 1.5,
						faces: [0],
						sheet: 'varnish',
						shelter: 'tarp'
					}
				]
			},
			{
				name: 'Bottom',
				steps: [
					{
						name: 'wet sand',
						kind: 'abrade',
						method: 'none',
						hours: 3,
						faces: [1],
						task: 'wetSanding'
					},
					{
						name: 'prime',
						kind: 'coat',
						method: 'roller',
						hours: 2,
						faces: [1],
						sheet: 'epoxyPrimer'
					}
				]
			}
		]
	},
	{
		name: 'Bellwether',
		stand: '11',
		heading: 95,
		owned: false,
		painted: true,
		hauled: 20,
		launch: 6,
		faces: [
			{
				name: 'driveLeg',
				side: 'both',
				material: 'casting',
				colour: 'bareAluminium',
				finish: 'matt',
				area: 0.8
			},
			{
				name: 'bottom',
				side: 'port',
				material: 'aluminium',
				colour: 'dark',
				finish: 'matt',
				area: 14
			}
		],
		jobs: [
			{
				name: 'Drive leg',
				steps: [
					{
						name: 'prime',
						kind: 'coat',
						method: 'brush',
						hours: 0.75,
						faces: [0],
						sheet: 'aluminiumPrimer',
						limits: { surfaceTrend: 'rising' }
					}
				]
			},
			{
				name: 'Launch',
				steps: [
					{
						name: 'launch',
						kind: 'launch',
						method: 'none',
						hours: 0.75,
						faces: [1],
						task: 'launch'
					}
				]
			}
		]
	},
	{
		name: 'Merrow',
		stand: '2',
		heading: 300,
		owned: false,
		painted: true,
		hauled: 3,
		launch: 30,
		faces: [
			{
				name: 'topsides',
				side: 'port',
				material: 'steel',
				colour: 'white',
				finish: 'gloss',
				area: 16
			},
			{
				name: 'topsides',
				side: 'starboard',
				material: 'steel',
				colour: 'white',
				finish: 'gloss',
				area: 16
			}
		],
		jobs: [
			{
				name: 'Respray',
				steps: [
					{
						name: 'spray primer',
						kind: 'coat',
						method: 'airless',
						hours: 1.5,
						faces: [0, 1],
						sheet: 'epoxyPrimer',
						limits: { wind: { max: 5 }, gust: { max: 7 } }
					},
					{
						name: 'spray topcoat',
						kind: 'coat',
						method: 'hvlp',
						hours: 2,
						faces: [0, 1],
						sheet: 'polyurethaneTopcoat',
						shelter: 'tent'
					}
				]
			}
		]
	},
	{
		name: 'Pipistrelle',
		stand: '9',
		heading: 150,
		owned: false,
		painted: false,
		hauled: 1,
		launch: 12,
		faces: [
			{
				name: 'deck',
				side: 'both',
				material: 'coredGrp',
				colour: 'light',
				finish: 'nonSkid',
				area: 12
			},
			{ name: 'bottom', side: 'both', material: 'grp', colour: 'dark', finish: 'matt', area: 20 }
		],
		jobs: [
			{
				name: 'Antifouling',
				steps: [
					{
						name: 'pressure wash',
						kind: 'wash',
						method: 'none',
						hours: 2,
						faces: [1],
						task: 'pressureWash'
					},
					{
						name: 'degrease',
						kind: 'degrease',
						method: 'none',
						hours: 1,
						faces: [0],
						task: 'degreasing'
					}
				]
			}
		]
	}
];
