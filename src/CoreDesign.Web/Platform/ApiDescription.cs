using System.Text.Json.Serialization.Metadata;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Fields;
using Microsoft.AspNetCore.OpenApi;
using Microsoft.OpenApi;

namespace CoreDesign.Web.Platform;

/// <summary>What the OpenAPI document says beyond the shapes: the service's name, and of each input its meaning, unit and range, from the field catalogue.</summary>
internal static class ApiDescription
{
    public static void AddApiDescription(this IServiceCollection services) => services.AddOpenApi(o =>
    {
        o.AddDocumentTransformer((document, _, _) =>
        {
            document.Info.Title = "CoreDesign";
            document.Info.Version = "v1";
            document.Info.Description =
                "No-load figures of laminated transformer cores, the history of designs, steels, printed sheets. Units are in the names: windowHeight_mm is in " +
                "millimetres, noLoadLoss_W in watts. Unknown members are refused. Refusals are problem details (RFC 9457): errors holds, by JSON path, what is wrong " +
                "with value, range and mend.";
            return Task.CompletedTask;
        });
        o.AddSchemaTransformer((schema, context, _) =>
        {
            Describe(schema, context.JsonTypeInfo);
            return Task.CompletedTask;
        });
        o.AddOperationTransformer((operation, context, _) =>
        {
            if (context.Description.ActionDescriptor.EndpointMetadata.OfType<IfMatchNeeded>().Any())
            {
                operation.Parameters ??= [];
                operation.Parameters.Add(new OpenApiParameter
                {
                    Name = "If-Match",
                    In = ParameterLocation.Header,
                    Required = true,
                    Description = "Number of the revision that the change started from, in quotes: \"3\".",
                    Schema = new OpenApiSchema { Type = JsonSchemaType.String },
                });
            }

            return Task.CompletedTask;
        });
    });

    private static void Describe(OpenApiSchema schema, JsonTypeInfo type)
    {
        if (!Paths.TryGetValue(type.Type, out var path)) return;
        foreach (var (name, property) in schema.Properties ?? new Dictionary<string, IOpenApiSchema>())
        {
            var field = FieldCatalog.TryFind(path + name) ?? FieldCatalog.TryFind(path + name + "[]");
            if (field is not null && property is OpenApiSchema described) described.Description = $"{field.Help}. {field.Range}.";
        }
    }

    private static readonly Dictionary<Type, string> Paths = new()
    {
        [typeof(OrderInput)] = "order.",
        [typeof(ExcitedWindingInput)] = "excitedWinding.",
        [typeof(CoreInput)] = "core.",
        [typeof(LimbInput)] = "core.limb.",
        [typeof(StepInput)] = "core.limbSteps[].",
        [typeof(YokeInput)] = "core.yoke.",
        [typeof(ReturnLimbInput)] = "core.returnLimb.",
        [typeof(OtherWindingInput)] = "otherWinding.",
        [typeof(TertiaryInput)] = "tertiary.",
        [typeof(CapacitanceInput)] = "capacitance.",
        [typeof(JointInput)] = "joint.",
        [typeof(ModelInput)] = "model.",
        [typeof(MarginsInput)] = "margins.",
        [typeof(InrushInput)] = "margins.inrush.",
    };
}

/// <summary>Marks an endpoint that asks for the header If-Match.</summary>
internal sealed class IfMatchNeeded;
