namespace ResourceCheck.Cli.Commands;

/// <summary>The files that <c>new</c> writes.</summary>
internal static class Starter
{
    /// <summary>A commented script.</summary>
    public const string Script = """
        # A protocol script: one statement a line, blocks close with end.
        # See the knowledge, the timeline and the cost without computing:  resourcecheck inspect THIS_FILE

        protocol "Dov leaves the circle"
        about "Four parties share an antisymmetric state; one leaves, three keep a smaller one."

        # As many levels as parties: each of these four holds a qudit of four levels.
        parties Ada, Ben, Cyd, Dov
        resource antisymmetric on all

        # What Dov sees stays with Dov until it is announced.
        round "Dov leaves"
          Dov measures fourier as k
          Dov announces k
          Ada, Ben, Cyd apply complement(fourier, k)
        end

        # The state of those who stay is compared with the ideal one here.
        checkpoint "three left": fidelity with antisymmetric on Ada, Ben, Cyd

        success when true

        # What the protocol promises in an ideal world; resourcecheck verify proves or refutes it.
        claim "three left" = 1

        # What you need under your conditions; resourcecheck run says whether it is met.
        goal "three left" >= 0.80

        """;

    /// <summary>Conditions to go with it.</summary>
    public const string Conditions = """
        {
          "about": "Invented three-valley fibre network; every quantity carries its unit, and what is left out is ideal",
          "resource": { "white": 0.01 },
          "levels": {
            "decay": [
              { "from": 0, "to": 1, "lifetime": "3 ms" },
              { "from": 0, "to": 2, "lifetime": "3 ms" },
              { "from": 0, "to": 3, "lifetime": "3 ms" }
            ]
          },
          "flight": {
            "default": { "length": "2 km", "speed": "2.04e8 m/s", "attenuation": "0.2 dB/km", "heralded": true, "dephasing": 0.01 },
            "Dov": { "length": "5 km" }
          },
          "operations": { "duration": "2 us", "depolarising": 0.002 },
          "detection": { "duration": "5 us", "confusion": 0.005 },
          "messages": { "speed": "2.04e8 m/s", "processing": "1 us" },
          "preparation": { "attempts": "10 kHz", "success": 0.2 }
        }

        """;
}
